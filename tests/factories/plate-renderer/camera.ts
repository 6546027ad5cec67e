import { findHomography, plateCornersMm, type Homography } from '@/lib/evidence/tlc/homography';
import type { Point } from '@/lib/evidence/tlc/polyline';

export type View = {
  /** Between the optical axis and the plate's normal, degrees. */
  tiltDeg: number;
  /** The side to which the plate leans back, degrees. */
  leanDeg: number;
  /** The plate turned in the picture, degrees. */
  rollDeg: number;
  /** Share of the photo that the plate's outline spans in its tighter direction. */
  fill: number;
};

/**
 * Corners of a plate in a photo by a pinhole camera at 2.2 diagonals' distance that looks at its middle, scaled
 * to fill the photo as told. Pixels with the origin at the outer corner of the first pixel.
 */
export function viewCorners(
  plate: { widthMm: number; heightMm: number },
  photo: { width: number; height: number },
  view: View,
): Point[] {
  const rad = (deg: number) => (deg * Math.PI) / 180;
  const distance = 2.2 * Math.hypot(plate.widthMm, plate.heightMm);
  const seen = plateCornersMm(plate.widthMm, plate.heightMm).map((corner) => {
    const x = corner.x - plate.widthMm / 2;
    const y = corner.y - plate.heightMm / 2;
    const lean = rad(view.leanDeg);
    const u = x * Math.cos(lean) + y * Math.sin(lean);
    const v = -x * Math.sin(lean) + y * Math.cos(lean);
    // Tilt about the axis v; u goes into the depth.
    const tilted = u * Math.cos(rad(view.tiltDeg));
    const scale = distance / (distance + u * Math.sin(rad(view.tiltDeg)));
    const px = scale * (tilted * Math.cos(lean) - v * Math.sin(lean));
    const py = scale * (tilted * Math.sin(lean) + v * Math.cos(lean));
    const roll = rad(view.rollDeg);
    return { x: px * Math.cos(roll) - py * Math.sin(roll), y: px * Math.sin(roll) + py * Math.cos(roll) };
  });
  const [left, right] = [Math.min(...seen.map((p) => p.x)), Math.max(...seen.map((p) => p.x))];
  const [top, bottom] = [Math.min(...seen.map((p) => p.y)), Math.max(...seen.map((p) => p.y))];
  const scale = view.fill * Math.min(photo.width / (right - left), photo.height / (bottom - top));
  return seen.map((p) => ({
    x: photo.width / 2 + scale * (p.x - (left + right) / 2),
    y: photo.height / 2 + scale * (p.y - (top + bottom) / 2),
  }));
}

/** The map between two sets of corners; throws where there is none, since the renderer made them. */
export function requireMap(from: readonly Point[], to: readonly Point[]): Homography {
  const found = findHomography(from, to);
  if (!found.ok) throw new Error(found.problem);
  return found.matrix;
}
