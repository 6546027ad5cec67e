import { blur } from './blur';
import { flattenGround } from './flatten-ground';
import type { Point } from '../polyline';
import { eraseLine } from './erase-lines';
import { measureShape } from './spot-shape';
import { halve, newRaster, robustSpread, type Raster } from './raster';
import { DARK_OFFSET, type FlatPlate } from './rectify';

export type GroundKind = 'dark on bright' | 'coloured on pale' | 'pale on dark';

export type Contrast = {
  /** Half the size of the flat plate: spots stand up from zero, in standard deviations of one pixel's noise. */
  signal: Raster;
  kind: GroundKind;
};

type Direction = [number, number, number];

/** Noise is never taken as less than this, in ln(level), nor as less than a level, which JPEG takes away. */
const LEAST_NOISE = 0.004;
const ONE_LEVEL = 1;
/** A streak is thicker than this, a scratch thinner: pixels of the quarter-size picture, blurred. */
const THINNEST_STREAK = 1.7;
/** Mean level of the ground up to which it is a dark one. */
const DARK_GROUND = 75;
/** A departure from the ground that asks to be a spot's, in standard deviations after blurring. */
const STRONG = 6;

/**
 * One signal out of three colours. The plate is levelled channel by channel; what stands out of the noise over
 * the size of a spot shows in which direction of colour spots depart from the ground (largest eigenvector of
 * their second moments), and all pixels are projected on it. On a plate where nothing stands out, spots would be
 * dark on a bright ground and pale on a dark one. Pencil lines, in pixels of the flat plate, are bridged first.
 */
export function findContrast(plate: FlatPlate, lines: readonly (readonly Point[])[]): Contrast {
  const halves = plate.channels.map(halve);
  const levels = halves.map((half) => Math.exp(robustSpread(half.data).middle) - DARK_OFFSET) as Direction;
  const flats = halves.map(flattenGround);
  const scaled = flats.map((flat, c) => {
    const { spread } = robustSpread(flat.data);
    const unit = 1 / Math.max(spread, LEAST_NOISE, ONE_LEVEL / (levels[c]! + DARK_OFFSET));
    for (let i = 0; i < flat.data.length; i += 1) flat.data[i]! *= unit;
    const reach = Math.max(1.5, 0.004 * flat.height);
    for (const line of lines)
      eraseLine(
        flat,
        line.map((p) => ({ x: p.x / 2, y: p.y / 2 })),
        reach,
      );
    return flat;
  });
  const bright = (levels[0] + levels[1] + levels[2]) / 3;
  const usual = (bright > DARK_GROUND ? -1 : 1) / Math.sqrt(3);
  const seen = departure(scaled);
  // On a dark ground only what shines can be a spot; what is darker still is dirt.
  const believed = seen && (bright > DARK_GROUND || seen[0] + seen[1] + seen[2] > 0);
  const direction: Direction = believed ? seen : [usual, usual, usual];
  const signal = newRaster(scaled[0]!.width, scaled[0]!.height);
  for (let i = 0; i < signal.data.length; i += 1) {
    let sum = 0;
    for (let c = 0; c < 3; c += 1) sum += direction[c]! * scaled[c]!.data[i]!;
    signal.data[i] = sum;
  }
  const darker = direction[0] + direction[1] + direction[2] < 0;
  const saturation = Math.max(...levels) - Math.min(...levels);
  const kind =
    bright <= DARK_GROUND && !darker
      ? 'pale on dark'
      : darker && saturation > 70
        ? 'dark on bright'
        : 'coloured on pale';
  return { signal, kind };
}

/**
 * The direction of colour in which round blobs depart from the ground, signed so that most of it is positive. Each
 * blob has a vote that grows with the square of its departure; scratches, being long and thin, have none.
 */
function departure(scaled: readonly Raster[]): Direction | null {
  const small = scaled.map((raster) => blur(halve(raster), 2));
  const units = small.map((raster) => 1 / Math.max(0.05, robustSpread(raster.data).spread));
  const { width, height } = small[0]!;
  const size = newRaster(width, height);
  for (let at = 0; at < size.data.length; at += 1) {
    let sum = 0;
    for (let c = 0; c < 3; c += 1) sum += (small[c]!.data[at]! * units[c]!) ** 2;
    size.data[at] = Math.sqrt(sum);
  }
  const votes: Direction[] = [];
  // The rim of the plate, with its chips and shadows, has no vote.
  const rim = Math.ceil(0.04 * Math.min(width, height));
  for (let y = rim; y < height - rim; y += 1) {
    for (let x = rim; x < width - rim; x += 1) {
      const at = y * width + x;
      if (size.data[at]! < STRONG || !isPeak(size, at)) continue;
      const { major, minor, slant } = measureShape(size, x + 0.5, y + 0.5, 8);
      const streak = slant < 0.4 && minor > THINNEST_STREAK;
      if (major < 1.5 * minor || streak) votes.push(small.map((raster) => raster.data[at]!) as Direction);
    }
  }
  if (votes.length === 0) return null;
  const moments = new Float64Array(9);
  for (const vote of votes) for (let i = 0; i < 9; i += 1) moments[i]! += vote[(i / 3) | 0]! * vote[i % 3]!;
  const direction = largestEigenvector(moments);
  const sense = votes.reduce((sum, vote) => {
    const along = vote[0] * direction[0] + vote[1] * direction[1] + vote[2] * direction[2];
    return sum + along * Math.abs(along);
  }, 0);
  return sense < 0 ? (direction.map((v) => -v) as Direction) : direction;
}

function isPeak({ width, data }: Raster, at: number): boolean {
  const here = data[at]!;
  const around = [-width - 1, -width, -width + 1, -1, 1, width - 1, width, width + 1];
  return around.every((step) => data[at + step]! <= here);
}

/** Power iteration on a symmetric 3 x 3 matrix. */
function largestEigenvector(matrix: Float64Array): Direction {
  let v: Direction = [0.6, 0.58, 0.55];
  for (let round = 0; round < 40; round += 1) {
    const next = [0, 1, 2].map(
      (r) => matrix[3 * r]! * v[0] + matrix[3 * r + 1]! * v[1] + matrix[3 * r + 2]! * v[2],
    );
    const length = Math.hypot(...next) || 1;
    v = next.map((n) => n / length) as Direction;
  }
  return v;
}
