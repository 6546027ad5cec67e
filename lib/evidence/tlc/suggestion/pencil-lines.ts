import type { Point } from '../polyline';
import { newRaster, type Raster } from './raster';
import type { FlatPlate } from './rectify';
import { ridgeStrength } from './ridge';
import { simplifyLine } from './line-points';
import { traceLine, type TracedLine } from './trace-line';

export type PencilLine = {
  /** 2, 3 or 5 points from left to right, in pixels of the flat plate. */
  points: Point[];
  /** The line as it was followed, place by place, with all its jags. */
  trace: Point[];
  /** 0 to 1. */
  confidence: number;
};

export type PencilLines = { baseline: PencilLine | null; front: PencilLine | null };

/** Parts of the plate's height, from the top, in which the lines are looked for. */
const FRONT_ZONE = [0.012, 0.52] as const;
const BASELINE_ZONE = [0.6, 0.988] as const;
/** A line is believed if it is seen over this share of the plate's width. */
const LEAST_SUPPORT = 0.5;

/** The pencilled baseline near the bottom and the solvent front near the top; null for one that is not seen. */
export function findPencilLines(plate: FlatPlate): PencilLines {
  const grey = newRaster(plate.width, plate.height);
  const [r, g, b] = plate.channels;
  for (let i = 0; i < grey.data.length; i += 1) grey.data[i] = (r.data[i]! + g.data[i]! + b.data[i]!) / 3;
  const binWidth = Math.max(2, Math.round(plate.width / 110));
  const reach = Math.max(3, Math.round(0.0065 * plate.height));
  const ridges = ridgeStrength(grey, binWidth, reach);
  const search = ([top, bottom]: readonly [number, number]) =>
    bestOf(
      [ridges.dark, ridges.pale],
      Math.round(top * plate.height),
      Math.round(bottom * plate.height),
      binWidth,
    );
  return { front: search(FRONT_ZONE), baseline: search(BASELINE_ZONE) };
}

function bestOf(ridges: readonly Raster[], top: number, bottom: number, binWidth: number): PencilLine | null {
  const traces = ridges.map((ridge) => traceLine(ridge, top, bottom));
  const best = traces.reduce((one, other) => (other.support > one.support + 0.1 ? other : one));
  if (best.support < LEAST_SUPPORT) return null;
  const seen = seenPoints(best, binWidth);
  const fit = simplifyLine(seen);
  if (!fit) return null;
  // A line that wanders by many pixels is rather a chain of accidents.
  const steady = Math.max(0, 1 - fit.spread / (0.02 * (bottom - top) + 4));
  return {
    points: fit.line,
    trace: seen.map(({ x, y }) => ({ x, y })),
    confidence: Math.min(1, best.support) * (0.5 + 0.5 * steady),
  };
}

/** The stretch from the first to the last place where the line is seen for good, without what is doubtful. */
function seenPoints(trace: TracedLine, binWidth: number) {
  const seen = (bin: number) => trace.strengths[bin]! >= 2;
  const bins = trace.rows.length;
  let [first, last] = [0, bins - 1];
  while (first < last - 3 && !(seen(first) && seen(first + 1))) first += 1;
  while (last > first + 3 && !(seen(last) && seen(last - 1))) last -= 1;
  const points: (Point & { weight: number })[] = [];
  for (let bin = first; bin <= last; bin += 1) {
    if (trace.strengths[bin]! < 1) continue;
    points.push({
      x: (bin + 0.5) * binWidth,
      y: trace.rows[bin]!,
      weight: Math.min(4, trace.strengths[bin]!),
    });
  }
  return points;
}
