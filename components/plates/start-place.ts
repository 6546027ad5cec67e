import type { MarkMode } from './mark-modes';
import { isPointMode } from './mark-modes';
import { listOf, type MarkRef, type Marks, type Point } from './marks';

/** Where a mark starts that is set without pointing: near where such marks usually are, beside those that are there. */
export function startPlace(
  marks: Marks,
  selected: MarkRef | null,
  mode: MarkMode,
  { width, height }: { width: number; height: number },
): Point {
  if (mode === 'corner') {
    const ends = [
      { x: 0.05, y: 0.05 },
      { x: 0.95, y: 0.05 },
      { x: 0.95, y: 0.95 },
      { x: 0.05, y: 0.95 },
    ].map(({ x, y }) => ({ x: Math.round(width * x), y: Math.round(height * y) }));
    const apart = (a: Point, b: Point) => Math.hypot(a.x - b.x, a.y - b.y);
    // The end of the photo that is farthest from the corners that are there.
    const room = (end: Point) => Math.min(...marks.corners.map((corner) => apart(corner, end)), Infinity);
    return ends.reduce((best, end) => (room(end) > room(best) ? end : best));
  }
  if (isPointMode(mode)) {
    const share = [0.1, 0.9, 0.5, 0.3, 0.7][marks[listOf[mode]].length] ?? 0.5;
    return { x: Math.round(width * share), y: Math.round(height * (mode === 'baseline' ? 0.88 : 0.1)) };
  }
  const chosen = selected?.kind === 'lane' || selected?.kind === 'spot' ? selected.lane : null;
  const lane = chosen === null ? marks.lanes.at(-1) : marks.lanes[chosen];
  if (mode === 'spot' && lane) return { x: lane.x, y: Math.round(height / 2) };
  return { x: Math.round((width * (marks.lanes.length + 1)) / (marks.lanes.length + 2)), y: height / 2 };
}
