import { anchorEnds } from './anchor-ends';
import { anchorValleys } from './anchor-valleys';
import {
  baselineNodes,
  lowestNodes,
  reserveCorrectedTrace,
  subtractBaseline,
  type BaselineNode,
} from './baseline';
import { bendSignificance, bendUnderPeaks } from './bend-baseline';
import { findClusters, gapsBetween, inflectionDistance, type Cluster } from './bounds';
import { curvatureNoiseGain } from './curvature';
import type { Candidate } from './detect-peaks';
import { extendClusters } from './extend-clusters';
import { measureCluster, type MeasuredPeak } from './measure-cluster';
import { findNegativeDips, withoutDips, type Dip } from './negative-dips';
import { peakToPeakNoise, type NoiseLevels } from './noise';
import type { IntegrationParameters } from './parameters';
import { buildRunningSum, type RunningSum } from './running-sum';

export interface ResolvedTrace {
  peaks: MeasuredPeak[];
  clusters: Cluster[];
  nodes: BaselineNode[];
  corrected: Float64Array;
  running: RunningSum;
  windowPoints: number;
  noise: { peakToPeak: number; method: string };
  withoutGap: boolean;
  dips: Dip[];
}

const mostRounds = 4;
/** An unseparated bump on a flank counts only if it is this large against the flank (noise grows with signal). */
const smallestShoulderShare = 0.01;

function medianHalf(candidates: Candidate[], pointCount: number): number {
  if (candidates.length === 0) return Math.max(1, pointCount / 200);
  const halves = candidates.map(inflectionDistance).sort((a, b) => a - b);
  return halves[halves.length >> 1]!;
}

/** Corners of the baseline, nearer to each other where the drift is more bent than noise explains. */
function fittingNodes(
  sums: RunningSum,
  gaps: { from: number; to: number }[],
  windowPoints: number,
  half: number,
  deviation: number,
): BaselineNode[] {
  let nodes = baselineNodes(sums, gaps, windowPoints, deviation);
  for (
    let size = windowPoints >> 1;
    size >= Math.max(9, 4 * half) && bendSignificance(nodes, deviation) > 6;
    size >>= 1
  ) {
    nodes = baselineNodes(sums, gaps, size, deviation);
  }
  return nodes;
}

/** Whether a measured peak is a peak by the parameters, and not noise, a spike or the rim of a dip. */
function isReal(
  peak: MeasuredPeak,
  noise: NoiseLevels,
  peakToPeak: number,
  parameters: IntegrationParameters,
): boolean {
  const leastHeight = 0.5 * parameters.minimumSignalToNoise * peakToPeak;
  if (!(peak.height >= leastHeight) || !(peak.area > 0)) return false;
  if (peak.halfFrom !== null && peak.halfTo !== null && peak.halfTo - peak.halfFrom < 1.3) return false;
  if (peak.top.hasMaximum || peak.skimmed) return true;
  if (!parameters.reportShoulders) return false;
  const { strength, level } = peak.top.candidate;
  // Height of a Gaussian from the curvature at its top: second derivative times variance.
  const halfOfLevel = peak.top.half / 2 ** level;
  const bump = strength * noise.levelDeviation[level]! * curvatureNoiseGain * halfOfLevel * halfOfLevel;
  return bump >= leastHeight && bump >= smallestShoulderShare * peak.height;
}

/**
 * From candidates to measured peaks. Baseline and peaks depend on each other, so it goes round: extents, baseline, measurement,
 * and candidates that turn out to be none are dropped, until nothing changes.
 */
export function resolvePeaks(
  timeMin: Float64Array,
  signal: Float64Array,
  levels: Float64Array[],
  noiseLevels: NoiseLevels,
  found: Candidate[],
  parameters: IntegrationParameters,
): ResolvedTrace {
  const deviation = noiseLevels.levelDeviation[0]!;
  // The first baseline may be rough, and what is dropped does not come back: white noise is the judge then.
  const firstGuess = 6 * deviation;
  const signalSums = buildRunningSum(signal);
  const target = reserveCorrectedTrace(signal.length);
  const { corrected, running } = target;
  let candidates = found;
  let before: ResolvedTrace | null = null;
  // Stretches without even a dropped candidate: what was dropped must not count as noise.
  let quiet: { from: number; to: number }[] | null = null;
  for (let round = 1; ; round++) {
    const half = medianHalf(candidates, signal.length);
    const windowPoints = Math.max(9, Math.min(signal.length >> 2, Math.round(16 * half)));
    let clusters = findClusters(levels, noiseLevels.levelDeviation, candidates);
    if (before) {
      clusters = extendClusters(
        clusters,
        before.running,
        before.corrected,
        deviation,
        Math.max(3, Math.round(4 * half)),
      );
    }
    const gaps = withoutDips(gapsBetween(clusters, signal.length), before?.dips ?? [], signalSums, 16 * half);
    let nodes: BaselineNode[] = [];
    if (parameters.baseline !== 'none') {
      nodes =
        gaps.length > 0
          ? bendUnderPeaks(fittingNodes(signalSums, gaps, windowPoints, half, deviation), clusters, deviation)
          : lowestNodes(signalSums, signal.length, Math.max(3, Math.round(half)));
    }
    if (nodes.length > 0) nodes = anchorEnds(nodes, clusters, signal, signalSums, half);
    subtractBaseline(signal, nodes, target);
    if (parameters.baseline !== 'none') {
      const anchored = anchorValleys(
        nodes,
        clusters,
        running,
        deviation,
        parameters.baseline === 'valley-to-valley',
      );
      if (anchored !== nodes) {
        nodes = anchored;
        subtractBaseline(signal, nodes, target);
      }
    }
    quiet ??= gaps;
    const noise = peakToPeakNoise(corrected, quiet, 2.355 * half, deviation);
    const context = {
      timeMin,
      corrected,
      running,
      levels,
      deviation,
      skimHeightRatio: parameters.skimHeightRatio,
    };
    const measured = clusters.flatMap((cluster) => measureCluster(context, cluster));
    const peaks = measured.filter((peak) =>
      isReal(peak, noiseLevels, round === 1 ? firstGuess : noise.peakToPeak, parameters),
    );
    const dipWindow = Math.max(1, Math.round(half / 2));
    const leastDepth = 0.5 * parameters.minimumSignalToNoise * noise.peakToPeak;
    const state: ResolvedTrace = {
      dips: findNegativeDips(corrected, running, dipWindow, deviation, leastDepth),
      peaks,
      clusters,
      nodes,
      corrected,
      running,
      windowPoints,
      noise,
      withoutGap: gaps.length === 0,
    };
    const settled = peaks.length === measured.length && round > 1;
    if (settled || round === mostRounds) return state;
    if (peaks.length < measured.length) candidates = peaks.map((peak) => peak.top.candidate);
    before = state;
  }
}
