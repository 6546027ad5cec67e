import { applyHomography, findHomography, type Homography } from './homography';
import type { Point } from './polyline';

/** Outer size of a plate in mm, as far as it was entered. */
export type PlateSize = { widthMm?: number | null; heightMm?: number | null };

/**
 * The plane of the plate, origin at its top left corner, y downwards. In mm where both sizes are known; otherwise
 * relative: 1 is the whole width across and the whole height along.
 */
export type PlateFrame = {
  unit: 'mm' | 'relative';
  width: number;
  height: number;
  /** Null for a point beyond the horizon of the photo, which is no place on the plate. */
  toPlate: (photoPoint: Point) => Point | null;
  toPhoto: (platePoint: Point) => Point | null;
};

export type FrameResult = { ok: true; frame: PlateFrame } | { ok: false; problem: string };

/** Corners nearer than this determine a plate too badly, px. */
const SHORTEST_SIDE_PX = 20;

const depthAt = ([, , , , , , g, h, i]: Homography, { x, y }: Point) => g * x + h * y + i;

/** The map, restricted to the side of the horizon on which `inside` lies. */
function restrict(matrix: Homography, inside: Point): (point: Point) => Point | null {
  const sign = Math.sign(depthAt(matrix, inside));
  const scale = Math.abs(depthAt(matrix, inside));
  return (point) => (sign * depthAt(matrix, point) > 1e-6 * scale ? applyHomography(matrix, point) : null);
}

/** Twice the area between corners; above zero where they run clockwise on a screen. */
function turning(corners: readonly Point[]): number {
  return corners.reduce((sum, p, i) => {
    const q = corners[(i + 1) % corners.length]!;
    return sum + p.x * q.y - q.x * p.y;
  }, 0);
}

/** A plate of mm where both sizes are known, else the unit square. */
export function plateExtent({ widthMm, heightMm }: PlateSize): Pick<PlateFrame, 'unit' | 'width' | 'height'> {
  return widthMm && heightMm
    ? { unit: 'mm', width: widthMm, height: heightMm }
    : { unit: 'relative', width: 1, height: 1 };
}

/**
 * The plate seen through its four corners in a photo (px; top left, top right, bottom right, bottom left as the
 * solvent ran upwards). Corners that cross over, coincide, run the wrong way round or outline hardly anything are a
 * problem in words for the user.
 */
export function framePlate(corners: readonly Point[], size: PlateSize): FrameResult {
  const { unit, width, height } = plateExtent(size);
  const edge = [
    { x: 0, y: 0 },
    { x: width, y: 0 },
    { x: width, y: height },
    { x: 0, y: height },
  ];
  const there = findHomography(corners, edge);
  if (!there.ok) return there;
  const back = findHomography(edge, corners);
  if (!back.ok) return back;
  if (turning(corners) < 0) {
    return {
      ok: false,
      problem:
        'The corners run the wrong way round: mark them in order, top left, top right, bottom right, bottom left.',
    };
  }
  const shortest = Math.min(
    ...corners.map((p, i) => Math.hypot(p.x - corners[(i + 1) % 4]!.x, p.y - corners[(i + 1) % 4]!.y)),
  );
  if (shortest < SHORTEST_SIDE_PX) {
    return {
      ok: false,
      problem: `Two corners lie less than ${SHORTEST_SIDE_PX} pixels apart: mark the corners of the whole plate.`,
    };
  }
  return {
    ok: true,
    frame: {
      unit,
      width,
      height,
      toPlate: restrict(there.matrix, corners[0]!),
      toPhoto: restrict(back.matrix, edge[0]!),
    },
  };
}
