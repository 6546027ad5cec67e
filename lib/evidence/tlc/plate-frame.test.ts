import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measureMarks } from './measure-marks';
import { framePlate } from './plate-frame';
import type { Point } from './polyline';
import { projectMarks } from './project-marks';

const corners: Point[] = [
  { x: 212, y: 118 },
  { x: 861, y: 164 },
  { x: 905, y: 1290 },
  { x: 130, y: 1205 },
];
const others: Point[] = [
  { x: 90, y: 300 },
  { x: 700, y: 210 },
  { x: 760, y: 1500 },
  { x: 40, y: 1420 },
];
const size = { widthMm: 50, heightMm: 100 };
const frameOf = (points: Point[], of: Parameters<typeof framePlate>[1] = size) => {
  const framed = framePlate(points, of);
  if (!framed.ok) throw new Error(framed.problem);
  return framed.frame;
};

describe('the frame of a plate', () => {
  it('is in millimetres where both sizes are known, else in shares', () => {
    const middle = frameOf(corners).toPhoto({ x: 25, y: 50 })!;
    expect(frameOf(corners).toPlate(middle)!.y).toBeCloseTo(50, 9);
    const relative = frameOf(corners, { widthMm: 50 });
    expect(relative.unit).toBe('relative');
    expect(relative.toPlate(middle)!.x).toBeCloseTo(0.5, 9);
  });

  it('has no place for what lies beyond the horizon of the photo', () => {
    const steep = frameOf([
      { x: 400, y: 400 },
      { x: 600, y: 400 },
      { x: 900, y: 900 },
      { x: 100, y: 900 },
    ]);
    expect(steep.toPlate({ x: 500, y: 500 })).not.toBeNull();
    expect(steep.toPlate({ x: 500, y: 100 })).toBeNull();
  });

  it('refuses corners that are mirrored, crossed or too near, in words', () => {
    const [a, b, c, d] = corners as [Point, Point, Point, Point];
    expect(framePlate([b, a, d, c], size)).toMatchObject({
      ok: false,
      problem: expect.stringContaining('wrong way'),
    });
    expect(framePlate([a, c, b, d], size).ok).toBe(false);
    expect(
      framePlate(
        corners.map((p) => ({ x: p.x / 100, y: p.y / 100 })),
        size,
      ).ok,
    ).toBe(false);
  });
});

describe('marks on a tilted photo', () => {
  const photo = frameOf(corners);
  const place = (x: number, y: number) => photo.toPhoto({ x, y })!;

  it('have the Rf of the plate, wherever the lane and however the lines are tilted and curved', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 45, noNaN: true }),
        fc.double({ min: 0.02, max: 0.98, noNaN: true }),
        (x, rf) => {
          const line = [
            [0, 86],
            [50, 90],
          ] as const;
          const curve = [
            [0, 22],
            [25, 18],
            [50, 24],
          ] as const;
          const at = (points: readonly (readonly [number, number])[]) => {
            const k = points.findIndex(([right]) => right >= x);
            const [[x0, y0], [x1, y1]] = [points[k - 1]!, points[k]!];
            return y0 + ((x - x0) / (x1 - x0)) * (y1 - y0);
          };
          const spot = place(x, at(line) + rf * (at(curve) - at(line)));
          const { lanes, flags } = measureMarks({
            units: 'px',
            corners,
            ...size,
            baseline: line.map(([u, v]) => place(u, v)),
            front: curve.map(([u, v]) => place(u, v)),
            lanes: [{ spots: [spot] }],
          });
          expect(lanes[0]!.spots[0]!.rf).toBeCloseTo(rf, 9);
          expect(flags).toEqual([]);
        },
      ),
    );
  });

  it('are carried over to another photo of the plate, a line of one point too', () => {
    const marks = {
      units: 'px' as const,
      corners,
      baseline: [place(25, 88)],
      front: [place(3, 20), place(47, 22)],
      lanes: [{ x: place(20, 88).x, spots: [] }],
    };
    const other = frameOf(others);
    const projected = projectMarks(marks, others, size)!;
    expect(projected.baseline).toHaveLength(2);
    for (const point of projected.baseline) expect(other.toPlate(point)!.y).toBeCloseTo(88, 6);
    expect(other.toPlate(projected.front[1]!)!.x).toBeCloseTo(47, 6);
    expect(projectMarks({ ...marks, corners: null }, others, size)).toBeNull();
  });
});
