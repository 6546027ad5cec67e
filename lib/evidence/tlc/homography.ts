import type { Point } from './polyline';

/** 3 x 3 matrix in rows, scaled so that the last element is 1. */
export type Homography = readonly [number, number, number, number, number, number, number, number, number];

export type HomographyResult = { ok: true; matrix: Homography } | { ok: false; problem: string };

/**
 * The plane projective map that carries four points to four others (direct linear transformation: Hartley and
 * Zisserman, Multiple View Geometry, section 4.1, with the last element fixed at 1). Corners that cross over,
 * coincide or lie three on a line are a problem, in words for the user.
 */
export function findHomography(from: readonly Point[], to: readonly Point[]): HomographyResult {
  if (from.length !== 4 || to.length !== 4) return { ok: false, problem: 'Mark exactly four plate corners.' };
  if ([...from, ...to].some((p) => !Number.isFinite(p.x) || !Number.isFinite(p.y))) {
    return { ok: false, problem: 'A plate corner has no position: mark it again.' };
  }
  if (!isConvex(from) || !isConvex(to)) {
    return {
      ok: false,
      problem:
        'The corners do not outline a plate: mark them in order, top left, top right, bottom right, bottom left.',
    };
  }
  const rows: number[][] = [];
  from.forEach(({ x, y }, i) => {
    const { x: u, y: v } = to[i]!;
    rows.push([x, y, 1, 0, 0, 0, -u * x, -u * y, u], [0, 0, 0, x, y, 1, -v * x, -v * y, v]);
  });
  const h = solveLinear(rows);
  if (!h) return { ok: false, problem: 'The corners do not determine a plate: mark them further apart.' };
  return { ok: true, matrix: [...h, 1] as unknown as Homography };
}

/** Corners of a plate of the given size in mm, in the order top left, top right, bottom right, bottom left. */
export function plateCornersMm(widthMm: number, heightMm: number): Point[] {
  return [
    { x: 0, y: 0 },
    { x: widthMm, y: 0 },
    { x: widthMm, y: heightMm },
    { x: 0, y: heightMm },
  ];
}

/** Carries a point over. Throws a RangeError for a point on the horizon of the map. */
export function applyHomography(matrix: Homography, point: Point): Point {
  const [a, b, c, d, e, f, g, h, i] = matrix;
  const w = g * point.x + h * point.y + i;
  if (!Number.isFinite(w) || Math.abs(w) < 1e-12)
    throw new RangeError('The point has no image under this map.');
  return { x: (a * point.x + b * point.y + c) / w, y: (d * point.x + e * point.y + f) / w };
}

function isConvex(points: readonly Point[]): boolean {
  const size = Math.max(...points.map((p) => Math.hypot(p.x - points[0]!.x, p.y - points[0]!.y)));
  const turns = points.map((p, i) => {
    const q = points[(i + 1) % 4]!;
    const r = points[(i + 2) % 4]!;
    return (q.x - p.x) * (r.y - q.y) - (q.y - p.y) * (r.x - q.x);
  });
  const least = 1e-6 * size * size;
  return turns.every((t) => t > least) || turns.every((t) => t < -least);
}

/** Gauss elimination with partial pivoting of n rows of n coefficients and a right side; null if singular. */
function solveLinear(rows: number[][]): number[] | null {
  const m = rows.map((row) => [...row]);
  const n = m.length;
  for (let col = 0; col < n; col += 1) {
    let pivot = col;
    for (let r = col + 1; r < n; r += 1) if (Math.abs(m[r]![col]!) > Math.abs(m[pivot]![col]!)) pivot = r;
    if (Math.abs(m[pivot]![col]!) < 1e-12) return null;
    [m[col], m[pivot]] = [m[pivot]!, m[col]!];
    for (let r = 0; r < n; r += 1) {
      if (r === col) continue;
      const factor = m[r]![col]! / m[col]![col]!;
      for (let k = col; k <= n; k += 1) m[r]![k]! -= factor * m[col]![k]!;
    }
  }
  return m.map((row, i) => row[n]! / row[i]!);
}
