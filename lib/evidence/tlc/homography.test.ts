import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyHomography, findHomography, plateCornersMm } from './homography';
import type { Point } from './polyline';

const corners: Point[] = [
  { x: 212, y: 118 },
  { x: 861, y: 164 },
  { x: 905, y: 1290 },
  { x: 130, y: 1205 },
];
const plate = plateCornersMm(50, 100);
const matrixOf = (from: Point[], to: Point[]) => {
  const result = findHomography(from, to);
  if (!result.ok) throw new Error(result.problem);
  return result.matrix;
};

describe('plate corners that determine nothing', () => {
  it('are refused: three, coincident, on one line, crossed, or no numbers', () => {
    const [a, b, c, d] = corners as [Point, Point, Point, Point];
    expect(findHomography([a, b, c], plate).ok).toBe(false);
    expect(findHomography([a, a, c, d], plate).ok).toBe(false);
    expect(findHomography([a, c, b, d], plate).ok).toBe(false);
    expect(findHomography([a, { x: Number.NaN, y: 0 }, c, d], plate).ok).toBe(false);
    const flat = [0, 1, 2, 3].map((x) => ({ x, y: 2 * x }));
    expect(findHomography(flat, plate).ok).toBe(false);
  });

  it('are refused as a plate without width', () => {
    expect(findHomography(corners, plateCornersMm(0, 100)).ok).toBe(false);
  });
});

describe('photo to plate', () => {
  it('agrees with a null-space solution by singular value decomposition, computed apart', () => {
    // Reference: the 8 x 9 system of Hartley and Zisserman solved by SVD in another numerical library.
    const matrix = matrixOf(corners, plate);
    expect(matrix[0]).toBeCloseTo(8.04769592e-2, 9);
    expect(matrix[5]).toBeCloseTo(-11.5338581, 6);
    expect(matrix[7]).toBeCloseTo(1.83401578e-4, 11);
    const point = applyHomography(matrix, { x: 500, y: 700 });
    expect(point.x).toBeCloseTo(23.42931409, 6);
    expect(point.y).toBeCloseTo(55.17470695, 6);
  });

  it("agrees with Heckbert's closed form for a unit square (1989), in exact fractions", () => {
    const point = applyHomography(matrixOf(plate, corners), { x: 20, y: 60 });
    expect(point.x).toBeCloseTo(449.64033574943886, 8);
    expect(point.y).toBeCloseTo(749.8076750818525, 8);
  });

  it('there and back is where one was', () => {
    const there = matrixOf(corners, plate);
    const back = matrixOf(plate, corners);
    const inside = fc.record({
      x: fc.double({ min: 0, max: 50, noNaN: true }),
      y: fc.double({ min: 0, max: 100, noNaN: true }),
    });
    fc.assert(
      fc.property(inside, (point) => {
        const again = applyHomography(there, applyHomography(back, point));
        expect(again.x).toBeCloseTo(point.x, 8);
        expect(again.y).toBeCloseTo(point.y, 8);
      }),
    );
  });

  it('has no image for a point on the horizon', () => {
    expect(() => applyHomography([1, 0, 0, 0, 1, 0, 1, 0, 1], { x: -1, y: 5 })).toThrow(RangeError);
  });
});
