import { alongAt, type Point } from '../polyline';
import { newRaster, robustSpread } from './raster';
import type { FlatPlate } from './rectify';

/** In ln(level), three channels together: fainter ticks are not told from the rounding of JPEG. */
const LEAST_SPREAD = 0.02;

/**
 * Ticks across the baseline, one a lane, as drawn before spotting: places where a strip just above and a strip
 * just below the line are both darker than at either side. Answers x of each in pixels of the flat plate; empty
 * if fewer than one or more than 40 stand out.
 */
export function findOriginMarks(plate: FlatPlate, baseline: readonly Point[]): number[] {
  const { width, height, channels } = plate;
  const turned = baseline.map((p) => ({ across: p.x, along: p.y }));
  const near = Math.max(2, Math.round(0.0035 * height));
  const far = near + Math.max(2, Math.round(0.0045 * height));
  const strips = [-1, 1].map((side) => {
    const strip = newRaster(width, 1);
    for (let x = 0; x < width; x += 1) {
      const line = alongAt(turned, x + 0.5) ?? 0;
      for (let off = near; off <= far; off += 1) {
        const row = Math.max(0, Math.min(height - 1, Math.floor(line + side * off)));
        for (const channel of channels) strip.data[x]! += channel.data[row * width + x]!;
      }
    }
    return narrowDips(strip.data, Math.max(3, Math.round(0.009 * height)));
  });
  const both = strips[0]!.map((v, x) => Math.min(v, strips[1]![x]!));
  const marks: number[] = [];
  const apart = Math.max(6, 0.02 * width);
  for (let x = 2; x < width - 2; x += 1) {
    if (both[x]! < 5 || both[x]! < both[x - 1]! || both[x]! <= both[x + 1]!) continue;
    if (x < 0.02 * width || x > 0.98 * width) continue;
    const last = marks.at(-1);
    if (last !== undefined && x + 0.5 - last < apart) {
      if (both[x]! > both[Math.floor(last)]!) marks[marks.length - 1] = x + 0.5;
    } else marks.push(x + 0.5);
  }
  return marks.length <= 40 ? marks : [];
}

/** How much darker three pixels are than what lies `reach` to the left and to the right, in standard deviations. */
function narrowDips(strip: Float32Array, reach: number): Float32Array {
  const dips = strip.map((_, x) => {
    const three = (at: number) => {
      const middle = Math.max(1, Math.min(strip.length - 2, at));
      return (strip[middle - 1]! + strip[middle]! + strip[middle + 1]!) / 3;
    };
    return Math.min(three(x - reach), three(x + reach)) - three(x);
  });
  const { middle, spread } = robustSpread(dips);
  return dips.map((v) => (v - Math.min(0, middle)) / Math.max(spread, LEAST_SPREAD));
}
