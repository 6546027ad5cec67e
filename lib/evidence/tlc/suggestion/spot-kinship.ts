import type { Point } from '../polyline';
import type { Candidate, ScaleSpace } from './blob-candidates';

/** A spot already taken, as far as a weaker neighbour is judged by it. */
export type TakenSpot = Point & { sigma: number; peak: number };

/** Whether a weaker candidate is too near to a spot to be another one. */
export function isPartOf(candidate: Point & { sigma: number }, spot: TakenSpot): boolean {
  const distance = Math.hypot(candidate.x - spot.x, candidate.y - spot.y);
  if (distance < 1.6 * Math.max(candidate.sigma, spot.sigma)) return true;
  // A wider blob that takes in a stronger, finer spot is the sum of spots, not one of its own.
  return candidate.sigma > 1.3 * spot.sigma && distance < 2.4 * candidate.sigma;
}

/** The spot to which a much weaker candidate is joined without a valley or another spot between; or undefined. */
export function joinedSpot<T extends TakenSpot>(
  space: ScaleSpace,
  candidate: Candidate,
  spots: readonly T[],
): T | undefined {
  const apart = (a: Point, b: Point) => Math.hypot(a.x - b.x, a.y - b.y);
  return spots.find((spot) => {
    const distance = apart(spot, candidate);
    const between = (other: T) =>
      other !== spot && apart(other, candidate) < distance && apart(other, spot) < distance;
    return isJoined(space, candidate, spot, distance) && !spots.some(between);
  });
}

function isJoined(space: ScaleSpace, candidate: Candidate, spot: TakenSpot, distance: number): boolean {
  const sameLane = Math.abs(candidate.x - spot.x) < 1.2 * spot.sigma;
  if (distance > (sameLane ? 14 : 9) * spot.sigma || candidate.response > 0.6 * spot.peak) return false;
  // Smooth enough that a speck of dust makes no valley, not so much that the valley between two spots fills up.
  const finer = Math.min(2, space.sigmas.indexOf(spot.sigma) - 1);
  const smooth = space.smooth[Math.max(0, finer)]!;
  const level = (share: number) => {
    const x = Math.floor(spot.x + share * (candidate.x - spot.x));
    const y = Math.floor(spot.y + share * (candidate.y - spot.y));
    return smooth.data[y * smooth.width + x]!;
  };
  let least = Infinity;
  for (let share = 0.1; share < 0.99; share += 0.1) least = Math.min(least, level(share));
  return least > 0.75 * level(1);
}

/** A tail hangs towards the baseline, in the same lane, beyond the spot's own size. */
export function isTail(part: Point, spot: TakenSpot): boolean {
  return part.y - spot.y > 2.2 * spot.sigma && Math.abs(part.x - spot.x) < 1.2 * spot.sigma;
}
