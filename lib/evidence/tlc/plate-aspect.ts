import type { PlateSize } from './plate-frame';
import type { Point } from './polyline';

/** Height over width of a plate: from its sizes where both are known, else from the sides as the photo shows them. */
export function plateAspect(corners: readonly Point[], { widthMm, heightMm }: PlateSize): number {
  if (widthMm && heightMm) return heightMm / widthMm;
  const side = (i: number, k: number) =>
    Math.hypot(corners[i]!.x - corners[k]!.x, corners[i]!.y - corners[k]!.y);
  return (side(0, 3) + side(1, 2)) / (side(0, 1) + side(3, 2));
}
