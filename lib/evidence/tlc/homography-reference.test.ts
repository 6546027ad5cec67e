import { Matrix, SingularValueDecomposition } from 'ml-matrix';
import { expect, it } from 'vitest';
import { applyHomography, findHomography } from './homography';
import type { Point } from './polyline';

/**
 * The normalised direct linear transformation (Hartley and Zisserman, Multiple View Geometry, algorithm 4.2): the null
 * vector of the 8 x 9 system by singular value decomposition in ml-matrix, an independent library, which fixes the norm
 * of the matrix where ours fixes its last element.
 */
function referenceMap(from: Point[], to: Point[]): (point: Point) => Point {
  const normalise = (points: Point[]) => {
    const [cx, cy] = [0, 1].map((k) => points.reduce((sum, p) => sum + (k ? p.y : p.x), 0) / points.length);
    const size = points.reduce((sum, p) => sum + Math.hypot(p.x - cx!, p.y - cy!), 0) / points.length;
    const s = Math.SQRT2 / size;
    return new Matrix([
      [s, 0, -s * cx!],
      [0, s, -s * cy!],
      [0, 0, 1],
    ]);
  };
  const move = (m: Matrix, { x, y }: Point) => {
    const [u, v, w] = m.mmul(Matrix.columnVector([x, y, 1])).to1DArray() as [number, number, number];
    return { x: u / w, y: v / w };
  };
  const [t, u] = [normalise(from), normalise(to)];
  const rows = from.flatMap((point, i) => {
    const [p, q] = [move(t, point), move(u, to[i]!)];
    return [
      [-p.x, -p.y, -1, 0, 0, 0, q.x * p.x, q.x * p.y, q.x],
      [0, 0, 0, -p.x, -p.y, -1, q.y * p.x, q.y * p.y, q.y],
    ];
  });
  // A ninth row of zeros makes the null vector the last right singular vector.
  const svd = new SingularValueDecomposition(new Matrix([...rows, new Array<number>(9).fill(0)]));
  const h = svd.rightSingularVectors.getColumn(8);
  const inner = new Matrix([h.slice(0, 3), h.slice(3, 6), h.slice(6, 9)]);
  const inverse = new SingularValueDecomposition(u).inverse();
  const whole = inverse.mmul(inner).mmul(t);
  return (point) => move(whole, point);
}

it('agrees with the null space of the same corners by singular value decomposition in ml-matrix', () => {
  const plate = [
    { x: 0, y: 0 },
    { x: 50, y: 0 },
    { x: 50, y: 100 },
    { x: 0, y: 100 },
  ];
  const photos: Point[][] = [
    [
      { x: 212, y: 118 },
      { x: 861, y: 164 },
      { x: 905, y: 1290 },
      { x: 130, y: 1205 },
    ],
    [
      { x: 1020.5, y: 410.25 },
      { x: 2801, y: 301 },
      { x: 3120, y: 3702 },
      { x: 640, y: 3388 },
    ],
    // On its side in the photo.
    [
      { x: 1200, y: 90 },
      { x: 1250, y: 700 },
      { x: 80, y: 820 },
      { x: 60, y: 20 },
    ],
  ];
  for (const corners of photos) {
    const found = findHomography(corners, plate);
    if (!found.ok) throw new Error(found.problem);
    const reference = referenceMap(corners, plate);
    for (const share of [0.1, 0.35, 0.6, 0.85]) {
      const point = {
        x: corners[0]!.x + share * (corners[2]!.x - corners[0]!.x),
        y: corners[0]!.y + share * (corners[2]!.y - corners[0]!.y),
      };
      const [ours, theirs] = [applyHomography(found.matrix, point), reference(point)];
      expect(ours.x).toBeCloseTo(theirs.x, 7);
      expect(ours.y).toBeCloseTo(theirs.y, 7);
    }
  }
});
