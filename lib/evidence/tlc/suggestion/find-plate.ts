import type { Point } from '../polyline';
import { colourMeasures, largestPatch, measureColour, partingLevel } from './plate-mask';
import { areaOf, convexHull, lineThrough, orderCorners, outerQuadrilateral } from './quadrilateral';
import { reducePhoto, type RawPhoto } from './raster';
import { cornersOf, refineSide } from './side-lines';

export type FoundPlate = {
  /** Top left, top right, bottom right, bottom left, in pixels from the outer corner of the first pixel. */
  corners: Point[];
  /** 0 to 1. */
  confidence: number;
  fillsPhoto: boolean;
};

type Outline = { corners: Point[]; filled: number };

/** Long side of the small picture in which the plate is looked for. */
const SMALL_PX = 200;

/**
 * Where the plate lies in a photo. In a small picture the ground is parted from the table by several measures of
 * colour; the patch that best fills a four-sided outline is the plate, and its sides are moved onto the edges in
 * the photo itself. Where no outline has edges to show, the plate is taken to fill the photo.
 */
export function findPlate(photo: RawPhoto): FoundPlate {
  const factor = Math.max(1, Math.round(Math.max(photo.width, photo.height) / SMALL_PX));
  const small = reducePhoto(photo, factor);
  const outlines = findOutlines(small).sort((a, b) => b.filled - a.filled);
  let best: FoundPlate | null = null;
  for (const outline of outlines.slice(0, 4)) {
    const found = refine(photo, outline, factor);
    if (found && (!best || found.confidence > best.confidence)) best = found;
    if (best && best.confidence > 0.9) break;
  }
  return best ?? { corners: wholePhoto(photo), confidence: 0.5, fillsPhoto: true };
}

function findOutlines(small: RawPhoto): Outline[] {
  const outlines: Outline[] = [];
  const least = 0.08 * small.width * small.height;
  for (const measure of colourMeasures) {
    const raster = measureColour(small, measure);
    const middle = partingLevel(raster);
    const levels = [middle, partingLevel(raster, 0, middle - 1), partingLevel(raster, middle, 255)];
    for (const [i, level] of levels.entries()) {
      for (const above of i === 0 ? [true, false] : [i === 2]) {
        const patch = largestPatch(raster, level, above, least);
        if (!patch) continue;
        const corners = outerQuadrilateral(convexHull(patch.outline));
        if (!corners) continue;
        const filled = patch.area / areaOf(corners);
        if (filled > 0.88 && filled < 1.05) outlines.push({ corners: orderCorners(corners), filled });
      }
    }
    if (outlines.some((one) => one.filled > 0.985 && !touchesAllSides(one, small))) break;
  }
  return outlines.filter((one) => !touchesAllSides(one, small));
}

/** An outline that runs along the whole border of the photo tells nothing. */
function touchesAllSides({ corners }: Outline, small: RawPhoto): boolean {
  return [0, 1, 2, 3].every((i) => onBorder(corners[i]!, corners[(i + 1) % 4]!, small, 1.5));
}

function onBorder(a: Point, b: Point, size: { width: number; height: number }, near: number): boolean {
  const both = (test: (p: Point) => boolean) => test(a) && test(b);
  return (
    both((p) => p.x <= near) ||
    both((p) => p.y <= near) ||
    both((p) => p.x >= size.width - near) ||
    both((p) => p.y >= size.height - near)
  );
}

function refine(photo: RawPhoto, outline: Outline, factor: number): FoundPlate | null {
  let corners = outline.corners.map((p) => ({ x: p.x * factor, y: p.y * factor }));
  let supports: number[] = [];
  for (const reach of [3 * factor + 3, 12]) {
    supports = [];
    const sides = corners.map((from, i) => {
      const to = corners[(i + 1) % 4]!;
      if (onBorder(from, to, photo, 2 * factor)) return lineThrough(from, to);
      const side = refineSide(photo, from, to, reach);
      supports.push(side.support);
      return side.line;
    });
    const moved = cornersOf(sides);
    if (!moved) return null;
    corners = moved;
  }
  if (supports.length < 2) return null;
  const least = Math.min(...supports);
  const mean = supports.reduce((sum, s) => sum + s, 0) / supports.length;
  if (least < 0.3 || mean < 0.55) return null;
  const share = areaOf(corners) / (photo.width * photo.height);
  if (!(share > 0.05 && share < 1.3)) return null;
  // Sides hidden by the border of the photo are guessed, and the guess is worth less.
  const confidence = Math.min(1, mean) * Math.min(1, outline.filled) * (1 - 0.12 * (4 - supports.length));
  return { corners, confidence, fillsPhoto: false };
}

function wholePhoto({ width, height }: RawPhoto): Point[] {
  return [
    { x: 0, y: 0 },
    { x: width, y: 0 },
    { x: width, y: height },
    { x: 0, y: height },
  ];
}
