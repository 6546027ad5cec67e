import type { MarkPoint, Marks, Point } from './marks';

const middleOf = (points: readonly Point[]): Point => ({
  x: points.reduce((sum, point) => sum + point.x, 0) / points.length,
  y: points.reduce((sum, point) => sum + point.y, 0) / points.length,
});
const apart = (a: Point, b: Point) => Math.hypot(a.x - b.x, a.y - b.y);

/**
 * Four corners, pressed in whatever order, as top left, top right, bottom right, bottom left: clockwise, and beginning
 * so that the front lies at the top and the baseline at the bottom, or, while there are no lines, with the corner that
 * is uppermost and leftmost in the photo. Fewer than four stay as they are.
 */
export function orderCorners({ corners, baseline, front }: Omit<Marks, 'lanes'>): MarkPoint[] {
  if (corners.length !== 4) return corners;
  const centre = middleOf(corners);
  const angle = (point: Point) => Math.atan2(point.y - centre.y, point.x - centre.x);
  const round = [...corners].sort((a, b) => angle(a) - angle(b));
  const turns = [0, 1, 2, 3].map((by) => [...round.slice(by), ...round.slice(0, by)]);
  const cost = ([tl, tr, br, bl]: readonly MarkPoint[]) =>
    baseline.length > 0 && front.length > 0
      ? apart(middleOf([tl!, tr!]), middleOf(front)) + apart(middleOf([br!, bl!]), middleOf(baseline))
      : tl!.x + tl!.y;
  return turns.reduce((best, one) => (cost(one) < cost(best) ? one : best));
}
