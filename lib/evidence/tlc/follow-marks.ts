import type { PlateSize } from './plate-frame';
import type { Point } from './polyline';
import { projectMarks } from './project-marks';
import type { PlateBody, PlatePhotoView } from './schema';

type Source = Pick<PlateBody, 'units' | 'corners' | 'baseline' | 'front'> & {
  lanes: readonly { x?: number | null; spots: readonly Point[] }[];
};
export type FollowedMarks = { baseline: Point[]; front: Point[]; laneX: (number | null)[] };

/** Lines that lie this near to where they were carried to are still the carried ones, px. */
const SAME_PLACE_PX = 0.5;

function isSameLine(one: readonly Point[], other: readonly Point[]): boolean {
  return (
    one.length === other.length &&
    one.every((point, i) => Math.hypot(point.x - other[i]!.x, point.y - other[i]!.y) <= SAME_PLACE_PX)
  );
}

/**
 * What becomes of lines and lanes in another photo of the plate when they are changed in one: those that were carried
 * over from it, and lie where they were carried to, go along; those that were drawn anew there stay. A lane that had no
 * place there yet gets one. Pure.
 */
export function followMarks(
  other: PlatePhotoView,
  before: { marks: Source; size: PlateSize } | null,
  after: { marks: Source; size: PlateSize },
): FollowedMarks {
  const { baseline, front } = other;
  const stay = { baseline, front, laneX: after.marks.lanes.map((_, l) => other.lanes[l]?.x ?? null) };
  if (!other.corners || other.units === 'mm' || !before) return stay;
  const old = projectMarks(before.marks, other.corners, before.size);
  const fresh = projectMarks(after.marks, other.corners, after.size);
  if (!old || !fresh) return stay;
  return {
    baseline: isSameLine(old.baseline, baseline) ? fresh.baseline : baseline,
    front: isSameLine(old.front, front) ? fresh.front : front,
    laneX: stay.laneX.map((x, l) => {
      const was = old.laneX[l];
      const follows = x === null || (typeof was === 'number' && Math.abs(was - x) <= SAME_PLACE_PX);
      return follows ? (fresh.laneX[l] ?? x) : x;
    }),
  };
}
