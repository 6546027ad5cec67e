import { meanOf, type RunningSum } from './running-sum';
import { drawSkimLine, type SkimLine } from './tangent-skim';
import type { Top } from './top';
import { findValley } from './valleys';

/** Small peaks on the tail or front of a big one, under one skim line. `tops` are positions in the cluster. */
export interface RiderGroup {
  tops: number[];
  from: number;
  to: number;
  skim: SkimLine;
}

/** A valley lower than this share of the small peak's height needs no skimming (common practice). */
const smallestTailUnderRider = 0.08;

interface Reach {
  from: number;
  to: number;
}

function highestIn(tops: Top[], from: number, to: number): number {
  let best = 0;
  for (let k = from; k < to; k++) best = Math.max(best, tops[k]!.height);
  return best;
}

/** Windows of plain tail before and after tops a..b, for an inflection distance `half`; null without room. */
function windowsAround(
  a: Top,
  b: Top,
  half: number,
  lowest: number,
  furthest: number,
  carrierBefore: boolean,
): [Reach, Reach] | null {
  // The far side starts further out: there the small peak's own tail has to be over.
  const [nearFrom, nearTo, farFrom, farTo] = [3, 6, 5.5, 9.5];
  const left = carrierBefore ? [nearFrom, nearTo] : [farFrom, farTo];
  const right = carrierBefore ? [farFrom, farTo] : [nearFrom, nearTo];
  const roomLeft = a.highest - lowest;
  const roomRight = furthest - b.highest;
  const toLeft = Math.min(left[1]! * half, roomLeft);
  const toRight = Math.min(right[1]! * half, roomRight);
  const before: Reach = {
    from: Math.floor(a.highest - toLeft),
    to: Math.floor(a.highest - Math.min(left[0]! * half, Math.max(0.7 * toLeft, 3 * half))),
  };
  const after: Reach = {
    from: Math.ceil(b.highest + Math.min(right[0]! * half, Math.max(0.7 * toRight, 3 * half))),
    to: Math.ceil(b.highest + toRight),
  };
  before.to = Math.max(before.from + 1, before.to);
  after.from = Math.min(after.to - 1, after.from);
  if (before.to > a.highest - half || after.from < b.highest + half) return null;
  return [before, after];
}

/** Inflection distance of what stands above the skim line, from its width at half height (2.355 for a Gaussian). */
function halfAbove(running: RunningSum, skim: SkimLine, top: Top, from: number, to: number): number {
  const width = Math.max(0, Math.floor(top.half / 6));
  const above = (i: number) => meanOf(running, i - width, i + width + 1) - skim.at(i);
  const level = 0.5 * above(top.highest);
  let left = top.highest;
  let right = top.highest;
  while (left > from && above(left) > level) left--;
  while (right < to && above(right) > level) right++;
  return (right - left) / 2.355;
}

/**
 * Tries one skim line under tops first..last; null where they do not ride on anything. The concave stretch of a rider is
 * narrower than the rider (the tail is convex), so the line is drawn, the width above it taken, and drawn again.
 */
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
  const highestBefore = highestIn(tops, 0, first);
  const highestAfter = highestIn(tops, last + 1, tops.length);
  const carrierBefore = highestBefore >= highestAfter;
  let half = Math.max(a.half, b.half);
  let windows = windowsAround(a, b, half, lowest, furthest, carrierBefore);
  if (!windows) return null;
  let skim = drawSkimLine(running, windows[0], windows[1], deviation);
  for (let round = 0; round < 4; round++) {
    const wider = Math.max(
      halfAbove(running, skim, a, windows[0].to, b.highest),
      halfAbove(running, skim, b, a.highest, windows[1].from),
    );
    if (!(wider > 1.1 * half)) break;
    const moved = windowsAround(a, b, wider, lowest, furthest, carrierBefore);
    if (!moved) break;
    half = wider;
    windows = moved;
    skim = drawSkimLine(running, windows[0], windows[1], deviation);
  }
  const [before, after] = windows;
  let rise = 0;
  for (let k = first; k <= last; k++) rise = Math.max(rise, tops[k]!.height - skim.at(tops[k]!.highest));
  const carrier = Math.max(highestBefore, highestAfter);
  if (!(rise > 0) || carrier < ratio * rise) return null;
  // Where the valley towards the carrier is nearly down to the baseline, a perpendicular does better.
  const edge = carrierBefore ? a : b;
  const width = Math.max(1, Math.floor(edge.half / 3)) | 1;
  const valley = carrierBefore
    ? findValley(running, Math.max(lowest, Math.floor(a.highest - 6 * half)), a.highest, width)
    : findValley(running, b.highest, Math.min(furthest, Math.ceil(b.highest + 6 * half)), width);
  if (edge.hasMaximum && valley.level < smallestTailUnderRider * rise) return null;
  const carriedOn = skim.kind === 'exponential';
  return {
    tops: range(first, last),
    from: before.to,
    to: carriedOn ? Math.max(after.to, furthest) : after.from,
    skim,
  };
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
