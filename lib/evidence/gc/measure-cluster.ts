import type { Cluster } from './bounds';
import type { PeakFlag } from './integration';
import { crossing, trapezoidArea } from './peak-figures';
import { findRiders, type RiderGroup } from './riders';
import { meanOf, type RunningSum } from './running-sum';
import { findTop, type Top } from './top';
import { findBend, findValley } from './valleys';

/** A measured peak in point indices; heights above baseline or skim line. start..end both included. */
export interface MeasuredPeak {
  top: Top;
  apexIndex: number;
  height: number;
  start: number;
  end: number;
  area: number;
  skimmed: boolean;
  halfFrom: number | null;
  halfTo: number | null;
  twentiethFrom: number | null;
  twentiethTo: number | null;
  flags: PeakFlag[];
}

export interface ClusterContext {
  timeMin: Float64Array;
  corrected: Float64Array;
  running: RunningSum;
  levels: Float64Array[];
  deviation: number;
  skimHeightRatio: number;
}

/** Edges of the peak at a share of its height, on the trace smoothed over a fraction of the peak. */
function edges(
  value: (index: number) => number,
  peak: { highest: number; height: number; start: number; end: number },
  share: number,
): { from: number | null; to: number | null } {
  const level = share * peak.height;
  return {
    from: crossing(value, peak.highest, -1, peak.start, level),
    to: crossing(value, peak.highest, 1, peak.end, level),
  };
}

function measure(
  context: ClusterContext,
  top: Top,
  start: number,
  end: number,
  group: RiderGroup | null,
  flags: PeakFlag[],
): MeasuredPeak {
  const { corrected, running, timeMin } = context;
  const skim = group?.skim ?? null;
  const under = (i: number) => (skim ? skim.at(i) : 0);
  const width = Math.max(0, Math.floor(top.half / 20));
  const smooth = (i: number) =>
    (width === 0 ? corrected[i]! : meanOf(running, i - width, i + width + 1)) - under(i);
  const height = top.height - under(top.apexIndex);
  const shape = { highest: top.highest, height, start, end };
  const half = top.hasMaximum || skim ? edges(smooth, shape, 0.5) : { from: null, to: null };
  const twentieth = top.hasMaximum || skim ? edges(smooth, shape, 0.05) : { from: null, to: null };
  const area = trapezoidArea(
    timeMin,
    skim ? (i) => corrected[i]! - skim.at(i) : (i) => corrected[i]!,
    start,
    end,
  );
  return {
    top,
    apexIndex: top.apexIndex,
    height,
    start,
    end,
    area,
    skimmed: skim !== null,
    halfFrom: half.from,
    halfTo: half.to,
    twentiethFrom: twentieth.from,
    twentiethTo: twentieth.to,
    flags,
  };
}

/** Place between two tops that are not skimmed: their valley, or the bend where one is a shoulder. */
function splitBetween(context: ClusterContext, a: Top, b: Top): { index: number; level: number } {
  const width = Math.max(1, Math.floor(Math.min(a.half, b.half) / 4)) | 1;
  if (a.hasMaximum && b.hasMaximum) return findValley(context.running, a.highest, b.highest, width);
  const level = Math.min(a.candidate.level, b.candidate.level);
  const index = findBend(context.levels, level, a.highest, b.highest);
  return { index, level: context.corrected[index]! };
}

function measureRiders(context: ClusterContext, tops: Top[], group: RiderGroup): MeasuredPeak[] {
  const { corrected } = context;
  const cuts = [group.from];
  for (let k = 1; k < group.tops.length; k++) {
    const a = tops[group.tops[k - 1]!]!;
    const b = tops[group.tops[k]!]!;
    let lowest = a.highest;
    for (let i = a.highest; i <= b.highest; i++) {
      if (corrected[i]! - group.skim.at(i) < corrected[lowest]! - group.skim.at(lowest)) lowest = i;
    }
    cuts.push(lowest);
  }
  cuts.push(Math.min(corrected.length - 1, group.to));
  return group.tops.map((position, k) => {
    const top = riderTop(context, tops[position]!, group);
    const flags: PeakFlag[] = ['tangent skimmed'];
    if (!tops[position]!.hasMaximum) flags.push('shoulder');
    if (k > 0) flags.push('not separated from the peak before');
    if (k + 1 < group.tops.length) flags.push('not separated from the peak after');
    return measure(context, top, cuts[k]!, cuts[k + 1]!, group, flags);
  });
}

/** Top of a rider above its skim line, which is not where the sum of peak and tail is highest. */
function riderTop(context: ClusterContext, top: Top, group: RiderGroup): Top {
  const reach = Math.ceil(1.5 * top.half);
  const from = Math.max(group.from, top.candidate.apex - reach);
  const to = Math.min(group.to - 1, top.candidate.apex + reach);
  const above = new Float64Array(Math.max(1, to - from + 1));
  for (let i = from; i <= to; i++) above[i - from] = context.corrected[i]! - group.skim.at(i);
  const sums = { sums: new Float64Array(above.length + 1), offset: 0 };
  for (let i = 0; i < above.length; i++) sums.sums[i + 1] = sums.sums[i]! + above[i]!;
  const local = findTop(above, sums, { ...top.candidate, from: 1, to: above.length - 2 });
  if (!local.hasMaximum) return top;
  const apexIndex = local.apexIndex + from;
  const underApex = group.skim.at(apexIndex);
  return {
    ...top,
    highest: local.highest + from,
    apexIndex,
    height: local.height + underApex,
    hasMaximum: true,
  };
}

/**
 * Splits a cluster into its peaks: small ones on tails are skimmed, the others parted by a perpendicular at the valley,
 * shoulders at the bend. Areas of a cluster add up to the area between trace and baseline.
 */
export function measureCluster(context: ClusterContext, cluster: Cluster): MeasuredPeak[] {
  const tops = cluster.candidates.map((candidate) => findTop(context.corrected, context.running, candidate));
  const groups =
    tops.length > 1
      ? findRiders(tops, cluster, context.running, context.deviation, context.skimHeightRatio)
      : [];
  const riding = new Set(groups.flatMap((group) => group.tops));
  const carriers = tops.filter((_, k) => !riding.has(k));
  const riders = groups.flatMap((group) => measureRiders(context, tops, group));

  const splits = carriers.slice(1).map((top, k) => splitBetween(context, carriers[k]!, top));
  const peaks = carriers.map((top, k) => {
    const start = k === 0 ? cluster.from : splits[k - 1]!.index;
    const end =
      k === carriers.length - 1 ? Math.min(cluster.to, context.corrected.length) - 1 : splits[k]!.index;
    const flags: PeakFlag[] = [];
    const joined = (level: number) => level > 0.02 * top.height + 3 * context.deviation;
    if (!top.hasMaximum) flags.push('shoulder');
    if (k > 0 && joined(splits[k - 1]!.level)) flags.push('not separated from the peak before');
    if (k < splits.length && joined(splits[k]!.level)) flags.push('not separated from the peak after');
    const peak = measure(context, top, start, end, null, flags);
    const carried = riders.filter((rider) => rider.apexIndex >= start && rider.apexIndex < end);
    if (carried.length > 0) flags.push('carries skimmed peaks');
    for (const rider of carried) peak.area -= rider.area;
    return peak;
  });
  return [...peaks, ...riders].sort((a, b) => a.apexIndex - b.apexIndex);
}
