import type { Point } from '../polyline';
import { findBlobs, type Candidate, type ScaleSpace } from './blob-candidates';
import type { Raster } from './raster';
import { isPartOf, isTail, joinedSpot, type TakenSpot } from './spot-kinship';
import { climbToPeak, measureShape } from './spot-shape';
import { innerRows, isInZone, isNearLine, keepZone, type SpotZone } from './spot-zone';

/** A spot on the signal of a plate, in its pixels. */
export type FoundSpot = Point & {
  sigma: number;
  height: number;
  toNoise: number;
  shape: 'spot' | 'streak';
  /** Standard deviation of the spot along its shorter axis, pixels, the smoothing taken off. */
  thickness: number;
};

/** What stands out less than this from the unrest of the plate, in its standard deviations, is no spot. */
const LEAST_TO_NOISE = 6.5;
/** Least height above the ground, in standard deviations of one pixel's noise. */
const LEAST_HEIGHT = 2.5;
const LEAST_SMALL_HEIGHT = 5.5;
/** Spots that stand out best at a narrower smoothing than this are small, pixels. */
const SMALL_SIGMA = 2;
/** A spot thinner than this (standard deviation, in pixels and as a share of the plate's size) is dust or a scratch. */
const THINNEST_PX = 1.25;
const THINNEST_SHARE = 0.0053;
/** Spots thinner than this belong to plates with many narrow lanes: fewer than so many of them are dust. */
const THIN_SHARE = 0.0074;
const FEWEST_THIN = 5;

/**
 * Spots of a plate: blobs between the lines that stand out of the noise, are neither thin as a scratch nor small
 * as dust, and are no part of a stronger one. A tail below a spot makes it a streak.
 */
export function findSpots(signal: Raster, zone: SpotZone): FoundSpot[] {
  const size = Math.sqrt(signal.width * signal.height);
  const widest = Math.min(0.05 * size, 0.09 * signal.width);
  const space = findBlobs(keepZone(signal, zone), innerRows(signal, zone), widest, LEAST_TO_NOISE);
  const spots: (FoundSpot & TakenSpot)[] = [];
  for (const candidate of space.candidates) {
    if (!isInZone(signal, candidate, zone) || spots.some((spot) => isPartOf(candidate, spot))) continue;
    const joined = joinedSpot(space, candidate, spots);
    if (joined) {
      if (isTail(candidate, joined)) joined.shape = 'streak';
      continue;
    }
    const spot = examine(space, candidate, zone, spots);
    if (spot) spots.push({ ...spot, peak: candidate.response });
  }
  return withoutSpecks(spots, size).map(({ peak: _peak, ...spot }) => spot);
}

/** A candidate as a spot, or null if it is something else. */
function examine(
  space: ScaleSpace,
  candidate: Candidate,
  zone: SpotZone,
  spots: readonly TakenSpot[],
): FoundSpot | null {
  const { sigma, toNoise, response } = candidate;
  const level = Math.max(0, space.sigmas.indexOf(sigma) - 1);
  const smooth = space.smooth[level]!;
  const size = Math.sqrt(smooth.width * smooth.height);
  const centre = climbToPeak(smooth, candidate.x, candidate.y, Math.ceil(sigma) + 2);
  // A shoulder has its peak elsewhere.
  if (Math.hypot(centre.x - candidate.x, centre.y - candidate.y) > 1.1 * sigma + 0.8) return null;
  if (spots.some((spot) => isPartOf({ ...centre, sigma }, spot))) return null;
  const height = smooth.data[Math.floor(centre.y) * smooth.width + Math.floor(centre.x)]!;
  // The brink of a pit stands out as well, but not above the ground; a small spot must be clear to be believed.
  if (height < (sigma < SMALL_SIGMA ? LEAST_SMALL_HEIGHT : LEAST_HEIGHT) || height < 1.4 * response)
    return null;

  const reach = 2.7 * sigma + 1;
  const { major, minor, slant } = measureShape(smooth, centre.x, centre.y, reach);
  // Moments above 30 % of the height are 0.65 of a Gauss function's; the smoothing is taken off again.
  const core = Math.sqrt(Math.max(0, (minor / 0.65) ** 2 - space.sigmas[level]! ** 2));
  const thickness = Math.min(core, breadth(space, level, centre));
  if (thickness < Math.max(THINNEST_PX, THINNEST_SHARE * size)) return null;
  // Along the development a spot may be drawn out into a streak; across it only a little.
  const elongation = major / minor;
  if (elongation > (slant < 0.4 ? 4 : 1.55)) return null;
  const long = slant < 0.4 && elongation > 1.5;
  // A tick of the pencil across the baseline.
  if (long && isNearLine(centre, zone.baseline, 0.02 * smooth.height)) return null;
  const alone = !spots.some(
    (s) => Math.abs(s.x - centre.x) < 2 * sigma && Math.abs(s.y - centre.y) < reach + 2 * s.sigma,
  );
  return { ...centre, sigma, height, toNoise, shape: long && alone ? 'streak' : 'spot', thickness };
}

/**
 * How broad a blob is, from how much its height falls from the finest smoothing to the next but one to its own: a
 * Gauss function's falls as 1/(variance + smoothing squared). A speck falls at once, whatever lies about it.
 */
function breadth(space: ScaleSpace, level: number, at: Point): number {
  const coarse = Math.min(space.sigmas.length - 1, level + 2);
  const heightAt = (index: number) => {
    const { data, width } = space.smooth[index]!;
    return data[Math.floor(at.y) * width + Math.floor(at.x)]!;
  };
  const fall = heightAt(0) / Math.max(1e-6, heightAt(coarse));
  if (fall < 1.02) return Infinity;
  return Math.sqrt(Math.max(0, (space.sigmas[coarse]! ** 2 - fall * space.sigmas[0]! ** 2) / (fall - 1)));
}

/** Spots of one plate are of like size: what is far smaller than the rest is dust or a nick. */
function withoutSpecks<T extends FoundSpot>(spots: T[], size: number): T[] {
  const sizes = spots.map((spot) => spot.thickness).sort((a, b) => a - b);
  const usual = sizes[sizes.length >> 1] ?? 0;
  const thin = THIN_SHARE * size;
  const few = spots.length < FEWEST_THIN;
  return spots.filter(
    ({ thickness }) => thickness > (thickness < thin ? 0.7 : 0.5) * usual && !(few && thickness < thin),
  );
}
