import { photoGeometry } from './photo-geometry';
import { plateAspect } from './plate-aspect';
import { plateExtent, type PlateSize } from './plate-frame';
import type { Point } from './polyline';
import type { PlatePhotoView } from './schema';

/** Marks in the units of a drawing over a picture of the plate or of the photo. */
export type DrawnMarks = {
  width: number;
  height: number;
  baseline: Point[];
  front: Point[];
  lanes: { label: string; x: number; baseY: number }[];
  spots: (Point & { name: string; isStreak: boolean })[];
};

/** Width of every drawing, units. */
const WIDTH = 1000;

type Place = (mark: Point) => Point | null;

function draw(photo: PlatePhotoView, height: number, place: Place): DrawnMarks {
  const line = (points: readonly Point[]) => {
    const drawn = points.flatMap((point) => place(point) ?? []).sort((a, b) => a.x - b.x);
    const [only] = drawn;
    return drawn.length === 1 && only
      ? [
          { x: 0, y: only.y },
          { x: WIDTH, y: only.y },
        ]
      : drawn;
  };
  const baseline = line(photo.baseline);
  const middle = baseline.reduce((sum, point) => sum + point.y, 0) / Math.max(1, baseline.length);
  return {
    width: WIDTH,
    height,
    baseline,
    front: line(photo.front),
    lanes: photo.lanes.flatMap((lane) => {
      const foot = lane.x === null ? null : place({ x: lane.x, y: photo.baseline[0]!.y });
      const x = foot?.x ?? null;
      return x === null ? [] : [{ label: lane.label, x, baseY: middle }];
    }),
    spots: photo.lanes.flatMap((lane) =>
      lane.spots.flatMap((spot, index) => {
        const at = place(spot);
        const isStreak = spot.flags.includes('streak');
        return at ? [{ ...at, name: `${lane.label}.${index + 1}`, isStreak }] : [];
      }),
    ),
  };
}

/**
 * Where the marks of a photo lie in its rectified picture; `height` follows the plate. Null for a photo without
 * corners.
 */
export function drawOnPlate(photo: PlatePhotoView, size: PlateSize): DrawnMarks | null {
  const geometry = photo.corners && photoGeometry(photo, size);
  if (!photo.corners || !geometry?.toPixels) return null;
  const { width, height } = plateExtent(size);
  const tall = WIDTH * plateAspect(photo.corners, size);
  const marks = draw(photo, tall, (mark) => {
    const on = geometry.toPlate(mark);
    return on && { x: (on.x / width) * WIDTH, y: (on.y / height) * tall };
  });
  // A lane's place on the plate is known better than by one point of the baseline.
  const lanes = photo.lanes.flatMap(({ label, plateX }) =>
    plateX === null ? [] : [{ label, x: (plateX / width) * WIDTH, baseY: marks.lanes[0]?.baseY ?? tall }],
  );
  return { ...marks, lanes };
}

/** Where the marks of a photo lie in the photo itself; null for marks in millimetres or an unknown size. */
export function drawOnPhoto(
  photo: PlatePhotoView,
  widthPx: number | null,
  heightPx: number | null,
): DrawnMarks | null {
  if (photo.units !== 'px' || !widthPx || !heightPx) return null;
  const scale = WIDTH / widthPx;
  return draw(photo, heightPx * scale, ({ x, y }) => ({ x: x * scale, y: y * scale }));
}
