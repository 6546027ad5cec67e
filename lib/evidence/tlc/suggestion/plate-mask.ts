import type { RawPhoto, Raster } from './raster';
import { newRaster } from './raster';

/** Pixels of one connected patch, with its outline's extreme pixels in each row and column. */
export type Patch = { area: number; outline: { x: number; y: number }[] };

/** Measures of colour in which a plate may stand out from the table: the channels, their spread, their shares. */
export const colourMeasures: readonly ((r: number, g: number, b: number) => number)[] = [
  (r, g, b) => (r + g + b) / 3,
  (r, g, b) => Math.max(r, g, b) - Math.min(r, g, b),
  (r, g, b) => (255 * (g + 8)) / (r + g + b + 24),
  (r, g, b) => (255 * (b + 8)) / (r + g + b + 24),
  (r) => r,
  (_r, g) => g,
  (_r, _g, b) => b,
];

export function measureColour(photo: RawPhoto, measure: (typeof colourMeasures)[number]): Raster {
  const raster = newRaster(photo.width, photo.height);
  for (let i = 0, at = 0; i < raster.data.length; i += 1, at += 3)
    raster.data[i] = measure(photo.data[at]!, photo.data[at + 1]!, photo.data[at + 2]!);
  return raster;
}

/**
 * The level between `low` and `high` that best parts a histogram of 256 levels in two: largest variance between
 * the classes (N. Otsu, IEEE Trans. Syst. Man Cybern. 9, 62 (1979)).
 */
export function partingLevel(raster: Raster, low = 0, high = 255): number {
  const counts = new Float64Array(256);
  for (const v of raster.data) if (v >= low && v <= high) counts[Math.min(255, v | 0)]! += 1;
  let [total, sum] = [0, 0];
  counts.forEach((count, level) => {
    total += count;
    sum += count * level;
  });
  let [below, sumBelow, best, at] = [0, 0, -1, low];
  for (let level = Math.floor(low); level < high; level += 1) {
    below += counts[level]!;
    sumBelow += counts[level]! * level;
    if (below === 0 || below === total) continue;
    const between = below * (total - below) * (sumBelow / below - (sum - sumBelow) / (total - below)) ** 2;
    if (between > best) [best, at] = [between, level];
  }
  return at + 1;
}

/** The largest connected patch of pixels above (or below) a level; null if there is none of that area at least. */
export function largestPatch(raster: Raster, level: number, above: boolean, leastArea: number): Patch | null {
  const { width, height, data } = raster;
  const seen = new Uint8Array(width * height);
  const stack = new Int32Array(width * height);
  let best = { start: -1, area: 0 };
  const flood = (start: number, mark: number): number => {
    let [depth, area] = [1, 0];
    stack[0] = start;
    seen[start] = mark;
    const visit = (at: number) => {
      if (seen[at]! < mark && (mark === 2 || data[at]! >= level === above)) {
        if (mark === 2 && seen[at] !== 1) return;
        seen[at] = mark;
        stack[depth] = at;
        depth += 1;
      }
    };
    while (depth > 0) {
      depth -= 1;
      const at = stack[depth]!;
      area += 1;
      const x = at % width;
      if (x > 0) visit(at - 1);
      if (x < width - 1) visit(at + 1);
      if (at >= width) visit(at - width);
      if (at < width * (height - 1)) visit(at + width);
    }
    return area;
  };
  for (let start = 0; start < seen.length; start += 1) {
    if (seen[start] || data[start]! >= level !== above) continue;
    const area = flood(start, 1);
    if (area > best.area) best = { start, area };
  }
  if (best.area < leastArea) return null;
  flood(best.start, 2);
  return outlineOf(seen, width, height);
}

/** Row by row the first and last pixel of the patch (marked 2); the area counts holes between them. */
function outlineOf(marks: Uint8Array, width: number, height: number): Patch {
  const outline: Patch['outline'] = [];
  let area = 0;
  for (let y = 0; y < height; y += 1) {
    const row = marks.subarray(y * width, (y + 1) * width);
    const first = row.indexOf(2);
    if (first < 0) continue;
    const last = row.lastIndexOf(2);
    area += last - first + 1;
    // Outer corners of the pixels, so that the outline takes in whole pixels.
    for (const x of [first, last + 1]) outline.push({ x, y }, { x, y: y + 1 });
  }
  return { area, outline };
}
