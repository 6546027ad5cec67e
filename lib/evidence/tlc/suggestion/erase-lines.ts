import type { Point } from '../polyline';
import { alongAt } from '../polyline';
import type { Raster } from './raster';

/**
 * Bridges a pencil line in a signal: rows within `reach` of it are replaced by the straight run from just above
 * to just below, column by column. Points in pixels of the signal, from left to right.
 */
export function eraseLine(signal: Raster, line: readonly Point[], reach: number) {
  const turned = line.map((p) => ({ across: p.x, along: p.y }));
  const { width, height, data } = signal;
  for (let x = 0; x < width; x += 1) {
    const y = alongAt(turned, x + 0.5);
    if (y === null) continue;
    const top = Math.round(y - 0.5 - reach) - 1;
    const bottom = Math.round(y - 0.5 + reach) + 1;
    if (top < 1 || bottom > height - 2) continue;
    const above = (data[top * width + x]! + data[(top - 1) * width + x]!) / 2;
    const below = (data[bottom * width + x]! + data[(bottom + 1) * width + x]!) / 2;
    for (let row = top + 1; row < bottom; row += 1)
      data[row * width + x] = above + ((below - above) * (row - top)) / (bottom - top);
  }
}
