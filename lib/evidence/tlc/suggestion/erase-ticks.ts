import { alongAt, type Point } from '../polyline';
import type { Raster } from './raster';

/**
 * Bridges the origin ticks of lanes in a signal: columns within `halfWidth` of each are replaced by the straight
 * run from left to right, in the rows about the baseline. A spot at the origin is wider and stays. All in pixels
 * of the signal.
 */
export function eraseTicks(
  signal: Raster,
  ticks: readonly number[],
  baseline: readonly Point[],
  halfWidth: number,
  halfHeight: number,
) {
  const { width, height, data } = signal;
  const turned = baseline.map((p) => ({ across: p.x, along: p.y }));
  for (const x of ticks) {
    const line = alongAt(turned, x);
    const left = Math.round(x - 0.5 - halfWidth) - 1;
    const right = Math.round(x - 0.5 + halfWidth) + 1;
    if (line === null || left < 1 || right > width - 2) continue;
    const bottom = Math.min(height - 1, Math.round(line + halfHeight));
    for (let y = Math.max(0, Math.round(line - halfHeight)); y <= bottom; y += 1) {
      const row = y * width;
      const before = (data[row + left]! + data[row + left - 1]!) / 2;
      const after = (data[row + right]! + data[row + right + 1]!) / 2;
      for (let u = left + 1; u < right; u += 1)
        data[row + u] = before + ((after - before) * (u - left)) / (right - left);
    }
  }
}
