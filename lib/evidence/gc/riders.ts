import type { RunningSum } from './running-sum';
import { drawSkimLine, type SkimLine } from './tangent-skim';
import type { Top } from './top';

/** Small peaks on the tail or front of a big one, under one skim line. `tops` are positions in the cluster. */
export interface RiderGroup {
  tops: number[];
  from: number;
  to: number;
  skim: SkimLine;
}

interface Reach {
  from: number;
  to: number;
}

function highestIn(tops: Top[], from: number, to: number): number {
  let best = 0;
  for (let k = from; k < to; k++) best = Math.max(best, tops[k]!.height);
  return best;
}

/** Tries one skim line under tops first..last; null where they do not ride on anything. */
function trySkim(
  tops: Top[],
  first: number,
  last: number,
  cluster: Reach,
  running: RunningSum,
  deviation: number,
  ratio: number,
): RiderGroup | null {
  const a = tops[first]!;
  const b = tops[last]!;
  const previous = tops[first - 1];
  const next = tops[last + 1];
  const lowest = previous ? Math.ceil(previous.highest + 1.5 * previous.half) : cluster.from;
  const furthest = next ? Math.floor(next.highest - 2.5 * next.half) : cluster.to;
  const before: Reach = { from: Math.floor(a.highest - 6 * a.half), to: Math.floor(a.highest - 3 * a.half) };
  const after: Reach = { from: Math.ceil(b.highest + 3 * b.half), to: Math.ceil(b.highest + 7 * b.half) };
  before.from = Math.max(lowest, before.from);
  before.to = Math.max(before.from + 1, before.to);
  after.to = Math.min(furthest, after.to);
  after.from = Math.min(after.to - 1, after.from);
  if (before.to > a.highest - a.half || after.from < b.highest + b.half) return null;

  const skim = drawSkimLine(running, before, after, deviation);
  let rise = 0;
  for (let k = first; k <= last; k++) rise = Math.max(rise, tops[k]!.height - skim.at(tops[k]!.highest));
  const carrier = Math.max(highestIn(tops, 0, first), highestIn(tops, last + 1, tops.length));
  const under = skim.at((a.highest + b.highest) / 2);
  if (!(rise > 0) || carrier < ratio * rise || under < 0.05 * rise) return null;
  const carriedOn = skim.kind === 'exponential';
  return { tops: range(first, last), from: before.to, to: carriedOn ? Math.max(after.to, furthest) : after.from, skim };
}

function range(first: number, last: number): number[] {
  return Array.from({ length: last - first + 1 }, (_, k) => first + k);
}

/** Whether a top can ride at all: one neighbour in the cluster is much higher. */
function mayRide(tops: Top[], k: number, ratio: number): boolean {
  const highest = Math.max(highestIn(tops, 0, k), highestIn(tops, k + 1, tops.length));
  return highest > 1.5 * tops[k]!.height && ratio > 1;
}

/**
 * Small peaks of a cluster that must be skimmed: at least `ratio` times lower than the peak they ride on, standing on a tail
 * that is still there under them. Neighbours that touch share one skim line.
 */
export function findRiders(
  tops: Top[],
  cluster: Reach,
  running: RunningSum,
  deviation: number,
  ratio: number,
): RiderGroup[] {
  const groups: RiderGroup[] = [];
  for (let k = 0; k < tops.length; k++) {
    if (!mayRide(tops, k, ratio)) continue;
    let last = k;
    while (
      last + 1 < tops.length &&
      mayRide(tops, last + 1, ratio) &&
      tops[last + 1]!.highest - tops[last]!.highest < 4 * (tops[last]!.half + tops[last + 1]!.half)
    ) {
      last++;
    }
    const shared = last > k ? trySkim(tops, k, last, cluster, running, deviation, ratio) : null;
    if (shared) {
      groups.push(shared);
      k = last;
      continue;
    }
    const alone = trySkim(tops, k, k, cluster, running, deviation, ratio);
    if (alone) groups.push(alone);
  }
  return groups;
}
