import { photoGeometry, type MarkedPhoto, type PhotoGeometry } from './photo-geometry';
import { framePlate, type PlateSize } from './plate-frame';
import { alongAt, type Point } from './polyline';

export type ProjectedMarks = {
  baseline: Point[];
  front: Point[];
  /** Where each lane crosses the baseline, px; null for a lane whose place is not known. */
  laneX: (number | null)[];
};

type Source = MarkedPhoto & { lanes: readonly { x?: number | null; spots: readonly Point[] }[] };

/** Where a lane of a photo stands on its baseline, in the units of its marks. */
export function laneFoot(source: Pick<Source, 'baseline'>, lane: Source['lanes'][number]): Point | null {
  const spots = lane.spots.map((spot) => spot.x);
  const x = lane.x ?? (spots.length > 0 ? spots.reduce((sum, one) => sum + one, 0) / spots.length : null);
  if (x === null) return null;
  const up = alongAt(
    source.baseline.map((point) => ({ across: point.x, along: -point.y })),
    x,
  );
  return up === null ? null : { x, y: -up };
}

/** Where a lane stands across the plate; null for a lane whose place is not known. */
export function plateXOfLane(
  source: Pick<Source, 'baseline'>,
  lane: Source['lanes'][number],
  { toPlate }: Pick<PhotoGeometry, 'toPlate'>,
): number | null {
  const foot = laneFoot(source, lane);
  return foot && (toPlate(foot)?.x ?? null);
}

/**
 * Baseline, front and lanes of one photo of a plate as they lie in another, by the corners of both. The plate is the
 * same, so its geometry is marked once. Null where one of the photos has no place on the plate.
 */
export function projectMarks(
  source: Source,
  corners: readonly Point[],
  size: PlateSize,
): ProjectedMarks | null {
  const from = photoGeometry(source, size);
  const to = framePlate(corners, size);
  if (!from || !to.ok || from.unit !== to.frame.unit) return null;
  const carry = (point: Point): Point | null => {
    const onPlate = from.toPlate(point);
    return onPlate && to.frame.toPhoto(onPlate);
  };
  // One point stands for a line straight across the plate, which is tilted in a tilted photo: it needs its two ends.
  const line = (points: readonly Point[]) => {
    const [only] = points;
    const onPlate = points.length === 1 && only ? from.toPlate(only) : null;
    const ends = onPlate
      ? [0, to.frame.width].map((x) => to.frame.toPhoto({ x, y: onPlate.y }))
      : points.map(carry);
    return ends.every((point) => point !== null) ? (ends as Point[]) : null;
  };
  const [baseline, front] = [line(source.baseline), line(source.front)];
  if (!baseline || !front) return null;
  const laneX = source.lanes.map((lane) => {
    const foot = laneFoot(source, lane);
    return foot && (carry(foot)?.x ?? null);
  });
  return { baseline, front, laneX };
}
