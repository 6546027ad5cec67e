import { alongAt, type Point } from '../polyline';
import { computeRf } from '../rf';
import { findContrast } from './contrast';
import { eraseTicks } from './erase-ticks';
import { findLanes, type FoundLane } from './find-lanes';
import { findPlate } from './find-plate';
import { findSpots, type FoundSpot } from './find-spots';
import { measureAreas, profileLane, STRIP_OF_PITCH } from './lane-profile';
import { orientPlate } from './orient-plate';
import type { PencilLines } from './pencil-lines';
import { reducePhoto, type Raster, type RawPhoto } from './raster';
import { toPhotoPoint, type FlatPlate } from './rectify';
import { doubtsOf } from './doubts';
import {
  SUGGESTION_METHOD_VERSION,
  type PlateSuggestion,
  type SuggestedLane,
  type SuggestedSpot,
} from './suggestion';

/** Long side at which a photo is looked at: a tenth of a millimetre on a usual plate, and quick. */
export const WORKING_LONG_PX = 1000;
const LEAST_PX = 64;

/**
 * Proposes corners, baseline, front, lanes and spots of a plate from the pixels of its photo. Pure; takes about a
 * tenth of a second. A photo larger than the working size is reduced first; places come back in its own pixels.
 */
export function suggestPlate(photo: RawPhoto): PlateSuggestion {
  if (Math.min(photo.width, photo.height) < LEAST_PX) throw tooSmall();
  const factor = Math.max(1, Math.round(Math.max(photo.width, photo.height) / WORKING_LONG_PX));
  const small = reducePhoto(photo, factor);
  const plate = findPlate(small);
  const oriented = orientPlate(small, plate.corners);
  if (!oriented) throw tooSmall();
  const { flat, lines } = oriented;
  const drawn = [lines.baseline, lines.front].flatMap((line) => (line ? [line.trace] : []));
  const { signal, kind } = findContrast(flat, drawn);
  const marks = oriented.marks.map((x) => x / 2);
  const halved = {
    baseline: lines.baseline ? halfOf(lines.baseline.points) : null,
    front: lines.front ? halfOf(lines.front.points) : null,
  };
  if (halved.baseline) {
    const [halfWidth, halfHeight] = [Math.max(1.5, 0.005 * signal.height), 0.018 * signal.height];
    eraseTicks(signal, marks, halved.baseline, halfWidth, halfHeight);
  }
  const spots = findSpots(signal, halved);
  const lanes = findLanes(spots, marks, signal.width);
  const up = (p: Point): Point => {
    const on = toPhotoPoint(flat, p);
    return { x: on.x * factor, y: on.y * factor };
  };
  const doubts = doubtsOf(plate, oriented, spots);
  return {
    corners: oriented.corners.map((p) => ({ x: p.x * factor, y: p.y * factor })),
    baseline: lines.baseline?.points.map(up) ?? [],
    front: lines.front?.points.map(up) ?? [],
    lanes: lanes.map((lane) => presentLane(lane, lanes, flat, signal, lines, up)),
    ground: kind,
    ...doubts,
    methodVersion: SUGGESTION_METHOD_VERSION,
  };
}

function tooSmall(): RangeError {
  return new RangeError(`The photo is too small to look for a plate: it needs ${LEAST_PX} pixels each way.`);
}

function halfOf(points: readonly Point[]): Point[] {
  return points.map((p) => ({ x: p.x / 2, y: p.y / 2 }));
}

function presentLane(
  lane: FoundLane,
  lanes: readonly FoundLane[],
  flat: FlatPlate,
  signal: Raster,
  lines: PencilLines,
  up: (p: Point) => Point,
): SuggestedLane {
  const rfs = lane.spots.map((spot) => rfOf(spot, lines));
  const shares = sharesOf(lane, lanes, signal, lines, rfs);
  const line = lines.baseline?.points.map((p) => ({ across: p.x, along: p.y }));
  const foot = (line && alongAt(line, 2 * lane.x)) ?? flat.height;
  const spots: SuggestedSpot[] = lane.spots.map((spot, i) => ({
    ...up({ x: 2 * spot.x, y: 2 * spot.y }),
    rf: rfs[i]!,
    relativeIntensity: shares[i]!,
    shape: spot.shape,
    confidence: Math.min(1, spot.toNoise / 20) * (rfs[i] === null ? 0.7 : 1),
  }));
  return { ...up({ x: 2 * lane.x, y: foot }), spots };
}

/** Rf on the plate freed of perspective, by the same sum as on the server for marks that a chemist sets. */
function rfOf(spot: FoundSpot, { baseline, front }: PencilLines): number | null {
  if (!baseline || !front) return null;
  const result = computeRf({
    spot: { x: 2 * spot.x, y: 2 * spot.y },
    baseline: baseline.points,
    front: front.points,
    units: 'px',
    perspectiveCorrected: true,
  });
  return result.ok ? result.rf : null;
}

function sharesOf(
  lane: FoundLane,
  lanes: readonly FoundLane[],
  signal: Raster,
  { baseline, front }: PencilLines,
  rfs: readonly (number | null)[],
): number[] {
  const even = lane.spots.map(() => 1 / Math.max(1, lane.spots.length));
  if (!baseline || !front || rfs.some((rf) => rf === null)) return even;
  const gaps = lanes.filter((other) => other !== lane).map((other) => Math.abs(other.x - lane.x));
  const widest = 3 * Math.max(...lane.spots.map((spot) => spot.sigma), 1);
  const halfWidth = Math.min(widest, STRIP_OF_PITCH * Math.min(...gaps, signal.width));
  const profile = profileLane(signal, lane.x, halfWidth, {
    baseline: halfOf(baseline.points),
    front: halfOf(front.points),
  });
  return profile ? measureAreas(profile, rfs as number[]).map((area) => area.shareOfLane) : even;
}
