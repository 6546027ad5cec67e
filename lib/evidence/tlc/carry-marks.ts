import type { PlateFrame } from './plate-frame';
import { alongAt, inferDirection, type Point } from './polyline';

/** Where the marks of one photo lie on the plate; null for what has no place there. */
export type CarriedLane = { x: number | null; spots: (Point | null)[] };
export type CarriedMarks = {
  baseline: (Point | null)[];
  front: (Point | null)[];
  lanes: CarriedLane[];
};

type MarksToCarry = {
  baseline: readonly Point[];
  front: readonly Point[];
  lanes: readonly { x?: number | null; spots: readonly Point[] }[];
};

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** A lane's place across the plate: where it crosses the baseline, or the mean of its spots where none was marked. */
function carryLane(
  lane: MarksToCarry['lanes'][number],
  spots: (Point | null)[],
  baseline: readonly Point[],
  toPlate: (point: Point) => Point | null,
): number | null {
  if (typeof lane.x === 'number') {
    const up = alongAt(
      baseline.map((point) => ({ across: point.x, along: -point.y })),
      lane.x,
    );
    if (up !== null) return toPlate({ x: lane.x, y: -up })?.x ?? null;
  }
  const known = spots.flatMap((spot) => (spot ? [spot.x] : []));
  return known.length > 0 ? mean(known) : null;
}

/**
 * Carries marks in pixels of a photo to the plate by its frame. A line of a single point runs straight across the
 * plate, which it still does there.
 */
export function carryMarks(marks: MarksToCarry, { toPlate }: Pick<PlateFrame, 'toPlate'>): CarriedMarks {
  return {
    baseline: marks.baseline.map(toPlate),
    front: marks.front.map(toPlate),
    lanes: marks.lanes.map((lane) => {
      const spots = lane.spots.map(toPlate);
      return { x: carryLane(lane, spots, marks.baseline, toPlate), spots };
    }),
  };
}

/**
 * From marks in millimetres to the plate's frame. Their y may have been measured from the lower edge, which shows in
 * a front that lies at larger y than the baseline: then it is turned over, for which the height must be known.
 */
export function turnMillimetres(
  marks: Pick<MarksToCarry, 'baseline' | 'front'>,
  heightMm: number | null | undefined,
): ((point: Point) => Point) | null {
  const direction = inferDirection(marks.baseline, marks.front);
  if (direction === 'up') return (point) => ({ x: point.x, y: point.y });
  return direction === 'down' && heightMm ? (point) => ({ x: point.x, y: heightMm - point.y }) : null;
}
