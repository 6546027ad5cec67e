import type { Point } from '../polyline';
import { colourMeasures, largestPatch, measureColour, partingLevel } from './plate-mask';
import { areaOf, convexHull, lineThrough, orderCorners, outerQuadrilateral } from './quadrilateral';
import { reducePhoto, type Raster, type RawPhoto } from './raster';
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
  let best: FoundPlate | null = null;
  for (const measure of colourMeasures) {
    const raster = measureColour(small, measure);
    const outlines = findOutlines(raster).sort((a, b) => b.filled - a.filled);
    for (const outline of outlines.slice(0, 2)) {
      const found = refine(photo, outline, factor);
      if (found && (!best || found.confidence > best.confidence)) best = found;
    }
    if (best && best.confidence > 0.9) break;
  }
  return best ?? { corners: wholePhoto(photo), confidence: 0.5, fillsPhoto: true };
}

/** Four-sided patches of one measure of colour, parted at the middle level and once more in each half. */
function findOutlines(raster: Raster): Outline[] {
  const outlines: Outline[] = [];
  const least = 0.08 * raster.width * raster.height;
  const middle = partingLevel(raster);
  const partings: [level: number, above: boolean][] = [
    [middle, true],
    [middle, false],
    [partingLevel(raster, 0, middle - 1), false],
    [partingLevel(raster, middle, 255), true],
  ];
  for (const [level, above] of partings) {
    const patch = largestPatch(raster, level, above, least);
    const corners = patch && outerQuadrilateral(convexHull(patch.outline));
    if (!patch || !corners) continue;
    const outline = { corners: orderCorners(corners), filled: patch.area / areaOf(corners) };
    if (outline.filled < 0.88 || outline.filled > 1.05 || touchesAllSides(outline, raster)) continue;
    outlines.push(outline);
    if (outline.filled > 0.97) break;
  }
  return outlines;
}

/** An outline that runs along the whole border of the photo tells nothing. */
function touchesAllSides({ corners }: Outline, small: Raster): boolean {
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
