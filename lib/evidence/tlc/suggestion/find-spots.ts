import { alongAt, type Point } from '../polyline';
import { findBlobs, type Candidate, type ScaleSpace } from './blob-candidates';
import type { Raster } from './raster';
import { climbToPeak, measureShape, type SpotShape } from './spot-shape';

/** A spot on the signal of a plate, in its pixels. */
export type FoundSpot = Point & {
  sigma: number;
  height: number;
  toNoise: number;
  shape: 'spot' | 'streak';
  /** Standard deviation of the spot's core along its shorter axis, pixels. */
  minor: number;
};

/** Where spots may lie: between the lines with a little to spare, or most of the plate if a line is missing. */
export type SpotZone = { baseline: readonly Point[] | null; front: readonly Point[] | null };

/** What stands out less than this from the unrest of the plate, in its standard deviations, is no spot. */
const LEAST_TO_NOISE = 6;
/** Least height above the ground, in standard deviations of one pixel's noise. */
const LEAST_HEIGHT = 2.5;
const LEAST_SMALL_HEIGHT = 5.5;
/** Spots that stand out best at a narrower smoothing than this are small, pixels. */
const SMALL_SIGMA = 2;
/** No pixel counts for less than this, in standard deviations of its noise. */
const DEEPEST = -2.5;
/** A spot thinner than this (standard deviation, in pixels and as a share of the plate's size) is dust or a scratch. */
const THINNEST_PX = 1.25;
const THINNEST_SHARE = 0.0046;
/** Share of the plate's width at each side that chips and shadows spoil. */
const RIM = 0.018;

/**
 * Spots of a plate: blobs between the lines that stand out of the noise, are neither thin as a scratch nor small
 * as dust, and are no part of a stronger one. A tail below a spot makes it a streak.
 */
export function findSpots(signal: Raster, zone: SpotZone): FoundSpot[] {
  const size = Math.sqrt(signal.width * signal.height);
  const widest = Math.min(0.05 * size, 0.09 * signal.width);
  const space = findBlobs(keepZone(signal, zone), innerRows(signal, zone), widest, LEAST_TO_NOISE);
  const spots: (FoundSpot & { peak: number })[] = [];
  for (const candidate of space.candidates) {
    const { sigma, toNoise, response } = candidate;
    if (!inZone(signal, candidate, zone) || spots.some((spot) => isPartOf(candidate, spot))) continue;
    const joined = nearestOf(spots, candidate);
    if (joined && isJoinedTo(space, candidate, joined)) {
      if (isTail(joined, candidate)) joined.shape = 'streak';
      continue;
    }
    const level = Math.max(0, space.sigmas.indexOf(sigma) - 1);
    const smooth = space.smooth[level]!;
    const reach = 3.2 * sigma + 1.5;
    const shape = measureShape(smooth, candidate.x, candidate.y, reach);
    if (!looksLikeSpot(shape, space.sigmas[level]!, size)) continue;
    const centre = climbToPeak(smooth, candidate.x, candidate.y, Math.ceil(sigma) + 1);
    const height = smooth.data[Math.floor(centre.y) * signal.width + Math.floor(centre.x)]!;
    // The brink of a pit stands out as well, but not above the ground; a small spot must be clear to be believed.
    if (height < (sigma < SMALL_SIGMA ? LEAST_SMALL_HEIGHT : LEAST_HEIGHT) || height < 1.4 * response)
      continue;
    const long = shape.slant < 0.4 && shape.major > 1.5 * shape.minor;
    // A tick of the pencil across the baseline.
    if (long && nearLine(candidate, zone.baseline, 0.02 * signal.height)) continue;
    const alone = !spots.some(
      (s) => Math.abs(s.x - centre.x) < 2 * sigma && Math.abs(s.y - centre.y) < reach + 2 * s.sigma,
    );
    const kind = long && alone ? 'streak' : 'spot';
    spots.push({ ...centre, sigma, height, toNoise, shape: kind, minor: shape.minor, peak: response });
  }
  return withoutSpecks(spots).map(({ peak: _peak, ...spot }) => spot);
}

/** Rows that lie between the lines all over the plate's width. */
function innerRows({ height }: Raster, { baseline, front }: SpotZone): { top: number; bottom: number } {
  const top = front ? Math.max(...front.map((p) => p.y)) : 0.08 * height;
  const bottom = baseline ? Math.min(...baseline.map((p) => p.y)) : 0.92 * height;
  return bottom - top > 8 ? { top: Math.ceil(top), bottom: Math.floor(bottom) } : { top: 0, bottom: height };
}

function nearestOf<T extends Point>(spots: readonly T[], at: Point): T | null {
  const distance = (spot: T) => Math.hypot(spot.x - at.x, spot.y - at.y);
  return spots.reduce<T | null>(
    (best, spot) => (best && distance(best) <= distance(spot) ? best : spot),
    null,
  );
}

function heightOf(line: readonly Point[], x: number): number | null {
  return alongAt(
    line.map((p) => ({ across: p.x, along: p.y })),
    x,
  );
}

function nearLine(at: Point, line: readonly Point[] | null, reach: number): boolean {
  const y = line && heightOf(line, at.x);
  return y !== null && Math.abs(at.y - y) < reach;
}

/**
 * The signal without what is written below the baseline and above the front, and without deep pits: a scratch or a
 * bare place of the layer says nothing about spots but would raise a brink about itself when smoothed.
 */
function keepZone(signal: Raster, { baseline, front }: SpotZone): Raster {
  const { width, height } = signal;
  const data = signal.data.map((v) => Math.max(DEEPEST, v));
  for (let x = 0; x < width; x += 1) {
    const top = (front && heightOf(front, x + 0.5)) ?? 0;
    const bottom = (baseline && heightOf(baseline, x + 0.5)) ?? height;
    for (let y = 0; y < Math.min(height, top - 0.008 * height); y += 1) data[y * width + x] = 0;
    for (let y = Math.max(0, Math.ceil(bottom + 0.02 * height)); y < height; y += 1) data[y * width + x] = 0;
  }
  return { width, height, data };
}

function inZone(signal: Raster, at: Point, { baseline, front }: SpotZone): boolean {
  const { width, height } = signal;
  if (at.x < RIM * width || at.x > (1 - RIM) * width) return false;
  const line = (points: readonly Point[] | null, instead: number) =>
    (points &&
      alongAt(
        points.map((p) => ({ across: p.x, along: p.y })),
        at.x,
      )) ??
    instead;
  const base = line(baseline, 0.94 * height);
  const top = line(front, 0.05 * height);
  const spare = 0.012 * (base - top);
  return at.y < base + spare && at.y > top - spare;
}

/** Whether a weaker candidate is too near to a spot to be another one. */
function isPartOf(candidate: Candidate, spot: FoundSpot): boolean {
  const distance = Math.hypot(candidate.x - spot.x, candidate.y - spot.y);
  if (distance < 1.6 * Math.max(candidate.sigma, spot.sigma)) return true;
  // A wider blob that takes in a stronger, finer spot is the sum of spots, not one of its own.
  return candidate.sigma > 1.3 * spot.sigma && distance < 2.4 * candidate.sigma;
}

/** Whether a much weaker candidate is joined to a spot without a valley between. */
function isJoinedTo(space: ScaleSpace, candidate: Candidate, spot: FoundSpot & { peak: number }): boolean {
  const distance = Math.hypot(candidate.x - spot.x, candidate.y - spot.y);
  const below = Math.abs(candidate.x - spot.x) < 1.2 * spot.sigma;
  if (distance > (below ? 14 : 9) * spot.sigma || candidate.response > 0.6 * spot.peak) return false;
  const smooth = space.smooth[Math.min(1, space.smooth.length - 1)]!;
  const level = (share: number) => {
    const x = Math.floor(spot.x + share * (candidate.x - spot.x));
    const y = Math.floor(spot.y + share * (candidate.y - spot.y));
    return smooth.data[y * smooth.width + x]!;
  };
  let least = Infinity;
  for (let share = 0.1; share < 0.99; share += 0.1) least = Math.min(least, level(share));
  return least > 0.8 * level(1);
}

/** A tail hangs towards the baseline, in the same lane, beyond the spot's own size. */
function isTail(spot: FoundSpot, part: Candidate): boolean {
  return part.y - spot.y > 2.2 * spot.sigma && Math.abs(part.x - spot.x) < 1.2 * spot.sigma;
}

function looksLikeSpot(shape: SpotShape, smoothing: number, size: number): boolean {
  const { major, minor, slant } = shape;
  // Moments above 30 % of the height are 0.65 of a Gauss function's; the smoothing is taken off again.
  const thickness = Math.sqrt(Math.max(0, (minor / 0.65) ** 2 - smoothing ** 2));
  if (thickness < Math.max(THINNEST_PX, THINNEST_SHARE * size)) return false;
  const elongation = major / minor;
  // Along the development a spot may be drawn out into a streak; across it only a little.
  return slant < 0.4 ? elongation < 4 : elongation < 1.55;
}

/** Spots of one plate are of like size: what is far smaller than the rest is dust or a nick. */
function withoutSpecks<T extends FoundSpot>(spots: T[]): T[] {
  if (spots.length < 2) return spots;
  const sizes = spots.map((spot) => spot.minor).sort((a, b) => a - b);
  const usual = sizes[sizes.length >> 1]!;
  return spots.filter((spot) => spot.minor > 0.5 * usual);
}
