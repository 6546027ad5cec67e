import type { Point } from '../polyline';

export type Line = { at: Point; direction: Point };

/** Convex hull, clockwise on the screen (monotone chain: A. M. Andrew, Inf. Process. Lett. 9, 216 (1979)). */
export function convexHull(points: readonly Point[]): Point[] {
  const sorted = [...points].sort((p, q) => p.x - q.x || p.y - q.y);
  const half = (list: readonly Point[]) => {
    const chain: Point[] = [];
    for (const p of list) {
      while (chain.length > 1 && turn(chain[chain.length - 2]!, chain[chain.length - 1]!, p) <= 0)
        chain.pop();
      chain.push(p);
    }
    return chain.slice(0, -1);
  };
  return [...half(sorted), ...half(sorted.reverse())];
}

function turn(a: Point, b: Point, c: Point): number {
  return (b.x - a.x) * (c.y - b.y) - (b.y - a.y) * (c.x - b.x);
}

export function areaOf(polygon: readonly Point[]): number {
  const twice = polygon.reduce((sum, p, i) => {
    const q = polygon[(i + 1) % polygon.length]!;
    return sum + p.x * q.y - q.x * p.y;
  }, 0);
  return Math.abs(twice) / 2;
}

/** Where two lines meet, or null if they are as good as parallel. */
export function meet(one: Line, other: Line): Point | null {
  const cross = one.direction.x * other.direction.y - one.direction.y * other.direction.x;
  if (Math.abs(cross) < 1e-6) return null;
  const t =
    ((other.at.x - one.at.x) * other.direction.y - (other.at.y - one.at.y) * other.direction.x) / cross;
  return { x: one.at.x + t * one.direction.x, y: one.at.y + t * one.direction.y };
}

export function lineThrough(a: Point, b: Point): Line {
  const length = Math.hypot(b.x - a.x, b.y - a.y) || 1;
  return { at: a, direction: { x: (b.x - a.x) / length, y: (b.y - a.y) / length } };
}

/**
 * A quadrilateral about a convex polygon: again and again the side goes whose removal, with its neighbours
 * lengthened until they meet, adds the least area. Null if four sides cannot be reached.
 */
export function outerQuadrilateral(hull: readonly Point[]): Point[] | null {
  let polygon = [...hull];
  while (polygon.length > 4) {
    const n = polygon.length;
    let best: { added: number; i: number; corner: Point } | null = null;
    for (let i = 0; i < n; i += 1) {
      const [a, b, c, d] = [-1, 0, 1, 2].map((k) => polygon[(i + k + n) % n]!) as [
        Point,
        Point,
        Point,
        Point,
      ];
      const corner = meet(lineThrough(a, b), lineThrough(d, c));
      // The neighbours must meet beyond the side, not behind it.
      if (!corner || turn(b, c, corner) > 0) continue;
      const added = areaOf([b, corner, c]);
      if (!best || added < best.added) best = { added, i, corner };
    }
    if (!best) return null;
    const { i, corner } = best;
    const next = (i + 1) % n;
    polygon[i] = corner;
    polygon = polygon.filter((_, k) => k !== next);
  }
  return polygon.length === 4 ? polygon : null;
}

/** The corners in the order top left, top right, bottom right, bottom left. */
export function orderCorners(corners: readonly Point[]): Point[] {
  const middle = {
    x: corners.reduce((sum, p) => sum + p.x, 0) / 4,
    y: corners.reduce((sum, p) => sum + p.y, 0) / 4,
  };
  const round = [...corners].sort(
    (p, q) => Math.atan2(p.y - middle.y, p.x - middle.x) - Math.atan2(q.y - middle.y, q.x - middle.x),
  );
  const first = round.reduce((best, p, i) => (p.x + p.y < round[best]!.x + round[best]!.y ? i : best), 0);
  return [...round.slice(first), ...round.slice(0, first)];
}
