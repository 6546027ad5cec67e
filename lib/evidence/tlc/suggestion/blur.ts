import { newRaster, type Raster } from './raster';

/** Means over a sliding window of 2 r + 1 along a line of pixels; the end pixels stand for what lies beyond. */
function slide(from: Float32Array, to: Float32Array, start: number, step: number, count: number, r: number) {
  const last = start + (count - 1) * step;
  let sum = from[start]! * (r + 1);
  for (let i = 1; i <= r; i += 1) sum += from[Math.min(last, start + i * step)]!;
  const share = 1 / (2 * r + 1);
  for (let i = 0, at = start; i < count; i += 1, at += step) {
    to[at] = sum * share;
    const enter = i + r + 1 < count ? at + (r + 1) * step : last;
    const leave = i - r >= 0 ? at - r * step : start;
    sum += from[enter]! - from[leave]!;
  }
}

/** The same down all columns at once, row by row, which is kind to the memory. */
function slideDown(from: Raster, to: Raster, r: number) {
  const { width, height } = from;
  const sum = new Float64Array(width);
  for (let i = -r; i <= r; i += 1) {
    const row = Math.min(height - 1, Math.max(0, i)) * width;
    for (let x = 0; x < width; x += 1) sum[x]! += from.data[row + x]!;
  }
  const share = 1 / (2 * r + 1);
  for (let y = 0; y < height; y += 1) {
    const row = y * width;
    const enter = Math.min(height - 1, y + r + 1) * width;
    const leave = Math.max(0, y - r) * width;
    for (let x = 0; x < width; x += 1) {
      to.data[row + x] = sum[x]! * share;
      sum[x]! += from.data[enter + x]! - from.data[leave + x]!;
    }
  }
}

/**
 * Blurs about as a Gauss function of standard deviation `sigma` pixels does: repeated sliding means of odd
 * widths whose variances, (w^2 - 1)/12 each, add up to sigma^2 as nearly as whole widths allow (P. Kovesi,
 * "Fast almost-Gaussian filtering", DICTA 2010). The cost does not depend on sigma.
 */
export function blur(from: Raster, sigma: number, passes = 3): Raster {
  const ideal = Math.sqrt((12 * sigma * sigma) / passes + 1);
  const narrow = Math.max(1, 2 * Math.floor((ideal - 1) / 2) + 1);
  const wide = narrow + 2;
  const narrowOnes = Math.round(
    (12 * sigma * sigma - passes * narrow * narrow - 4 * passes * narrow - 3 * passes) / (-4 * narrow - 4),
  );
  let current = from;
  const spare = [newRaster(from.width, from.height), newRaster(from.width, from.height)] as const;
  for (let pass = 0; pass < passes; pass += 1) {
    const r = ((pass < narrowOnes ? narrow : wide) - 1) / 2;
    if (r < 1) continue;
    for (let y = 0; y < from.height; y += 1)
      slide(current.data, spare[0].data, y * from.width, 1, from.width, r);
    slideDown(spare[0], spare[1], r);
    current = spare[1];
  }
  return current === from ? { ...from, data: Float32Array.from(from.data) } : current;
}
