import type { Point } from '../polyline';
import type { Raster } from './raster';

/**
 * Bridges a pencil line in a signal: rows within `reach` of it are replaced by the straight run from just above
 * to just below, column by column. At least two points in pixels of the signal, from left to right.
 */
export function eraseLine(signal: Raster, line: readonly Point[], reach: number) {
  const { width, height, data } = signal;
  let piece = 0;
  for (let x = 0; x < width; x += 1) {
    while (piece < line.length - 2 && line[piece + 1]!.x < x + 0.5) piece += 1;
    const [a, b] = [line[piece]!, line[piece + 1]!];
    // Beyond its ends the line is taken to run on level.
    const share = Math.max(0, Math.min(1, (x + 0.5 - a.x) / (b.x - a.x)));
    const y = a.y + share * (b.y - a.y);
    const top = Math.round(y - 0.5 - reach) - 1;
    const bottom = Math.round(y - 0.5 + reach) + 1;
    if (top < 1 || bottom > height - 2) continue;
    const above = (data[top * width + x]! + data[(top - 1) * width + x]!) / 2;
    const below = (data[bottom * width + x]! + data[(bottom + 1) * width + x]!) / 2;
    for (let row = top + 1; row < bottom; row += 1)
      data[row * width + x] = above + ((below - above) * (row - top)) / (bottom - top);
  }
}
