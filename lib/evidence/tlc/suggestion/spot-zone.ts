import { alongAt, type Point } from '../polyline';
import type { Raster } from './raster';

/** Where spots may lie: between the lines with a little to spare, or most of the plate if a line is missing. */
export type SpotZone = { baseline: readonly Point[] | null; front: readonly Point[] | null };

/** Share of the plate's width at each side that chips and shadows spoil. */
const RIM = 0.025;
/** Without a front this much of the plate at the top may be written on. */
const WITHOUT_FRONT = 0.14;
/** No pixel counts for less than this, in standard deviations of its noise. */
const DEEPEST = -2.5;

/** Row of a line at a column; null where the line has no single place. */
function heightOf(line: readonly Point[], x: number): number | null {
  return alongAt(
    line.map((p) => ({ across: p.x, along: p.y })),
    x,
  );
}

export function isInZone(signal: Raster, at: Point, { baseline, front }: SpotZone): boolean {
  const { width, height } = signal;
  if (at.x < RIM * width || at.x > (1 - RIM) * width) return false;
  const base = (baseline && heightOf(baseline, at.x)) ?? 0.94 * height;
  const top = (front && heightOf(front, at.x)) ?? WITHOUT_FRONT * height;
  const spare = 0.012 * (base - top);
  return at.y < base + spare && at.y > top - spare;
}

/** Rows that lie between the lines all over the plate's width. */
export function innerRows(
  { height }: Raster,
  { baseline, front }: SpotZone,
): { top: number; bottom: number } {
  const top = front ? Math.max(...front.map((p) => p.y)) : WITHOUT_FRONT * height;
  const bottom = baseline ? Math.min(...baseline.map((p) => p.y)) : 0.92 * height;
  return bottom - top > 8 ? { top: Math.ceil(top), bottom: Math.floor(bottom) } : { top: 0, bottom: height };
}

export function isNearLine(at: Point, line: readonly Point[] | null, reach: number): boolean {
  const y = line && heightOf(line, at.x);
  return y !== null && Math.abs(at.y - y) < reach;
}

/**
 * The signal without what is written below the baseline and above the front, and without deep pits: a scratch or a
 * bare place of the layer says nothing about spots but would raise a brink about itself when smoothed.
 */
export function keepZone(signal: Raster, { baseline, front }: SpotZone): Raster {
  const { width, height } = signal;
  const data = signal.data.map((v) => (v > DEEPEST ? v : DEEPEST));
  for (let x = 0; x < width; x += 1) {
    const top = (front && heightOf(front, x + 0.5)) ?? WITHOUT_FRONT * height;
    const bottom = (baseline && heightOf(baseline, x + 0.5)) ?? height;
    for (let y = 0; y < Math.min(height, top - 0.008 * height); y += 1) data[y * width + x] = 0;
    for (let y = Math.max(0, Math.ceil(bottom + 0.02 * height)); y < height; y += 1) data[y * width + x] = 0;
  }
  return { width, height, data };
}
