import type { PlateFrame } from '@/lib/evidence/tlc/plate-frame';
import type { PlateSize } from '@/lib/evidence/tlc/plate-frame';
import { projectMarks } from '@/lib/evidence/tlc/project-marks';
import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';
import { visualiserName } from '@/lib/evidence/tlc/visualiser-name';
import type { Lane, Marks, Point } from './marks';

/** A spot that another photo shows, at its place in this one. */
export type Ghost = Point & { key: string; lane: number; label: string; rf: number; visualiser: string };

/**
 * The spots of the other photos as they lie in this one: by the corners as they stand now, or, where the plate's size
 * has just been changed, as the server last saw them. Nothing where one of the photos has no corners.
 */
export function ghostsOf(
  photos: readonly PlatePhotoView[],
  evidenceId: string,
  frame: PlateFrame | null,
): Ghost[] {
  if (!frame) return [];
  return photos
    .filter((photo) => photo.evidenceId !== evidenceId)
    .flatMap((photo) =>
      photo.lanes.flatMap((lane, l) =>
        lane.spots.flatMap((spot, s): Ghost[] => {
          const isLive = photo.plateUnit === frame.unit && spot.plateX !== null && spot.plateY !== null;
          const place = isLive
            ? frame.toPhoto({ x: spot.plateX!, y: spot.plateY! })
            : (spot.projections.find((one) => one.evidenceId === evidenceId) ?? null);
          if (!place) return [];
          const visualiser = visualiserName(photo.visualiser);
          const key = `${photo.id} ${l} ${s}`;
          return [{ key, x: place.x, y: place.y, lane: l, label: lane.label, rf: spot.rf, visualiser }];
        }),
      ),
    );
}

/**
 * Baseline, front and the places of the lanes of another photo of the plate, by the corners of both: a plate is
 * measured out once. Null where one has no corners.
 */
export function linesFrom(
  source: PlatePhotoView,
  marks: Marks,
  size: PlateSize,
): Pick<Marks, 'baseline' | 'front' | 'lanes'> | null {
  if (marks.corners.length !== 4) return null;
  const projected = projectMarks(source, marks.corners, size);
  if (!projected) return null;
  const round = ({ x, y }: Point): Point => ({ x: Math.round(10 * x) / 10, y: Math.round(10 * y) / 10 });
  return {
    baseline: projected.baseline.map(round),
    front: projected.front.map(round),
    lanes: marks.lanes.map((lane, index): Lane => ({ ...lane, x: projected.laneX[index] ?? lane.x })),
  };
}
