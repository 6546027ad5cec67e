import { describe, expect, it } from 'vitest';
import { seededRandom } from '@/tests/factories/plate-renderer/random';
import { measureMarks } from './measure-marks';
import { framePlate } from './plate-frame';
import type { Point } from './polyline';

// Monte Carlo propagation of distributions: JCGM 101:2008, Supplement 1 to the GUM, against JCGM 100:2008, 5.1.2.
const DRAWS = 24_000;
const u = 0.5;

const corners: Point[] = [
  { x: 212, y: 118 },
  { x: 861, y: 164 },
  { x: 905, y: 1290 },
  { x: 130, y: 1205 },
];
const size = { widthMm: 50, heightMm: 100 };
const framed = framePlate(corners, size);
if (!framed.ok) throw new Error(framed.problem);
const { toPhoto } = framed.frame;

const normal = (random: ReturnType<typeof seededRandom>) =>
  Math.sqrt(-2 * Math.log(random.between(1e-12, 1))) * Math.cos(2 * Math.PI * random.between(0, 1));

const spread = (values: readonly number[]) => {
  const mean = values.reduce((sum, v) => sum + v, 0) / values.length;
  return Math.sqrt(values.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (values.length - 1));
};

/** Rf of marks at places on the plate in mm, through the tilted photo and back. */
function measure(baselineY: number, frontY: number, spot: Point, seenCorners = corners) {
  const line = (y: number) => [toPhoto({ x: 2, y })!, toPhoto({ x: 48, y })!];
  const { lanes, problems } = measureMarks({
    units: 'px',
    corners: seenCorners,
    ...size,
    baseline: line(baselineY),
    front: line(frontY),
    lanes: [{ spots: [toPhoto(spot)!] }],
  });
  if (!lanes[0]?.spots[0]) throw new Error(problems[0]?.message);
  return lanes[0].spots[0];
}

describe('the uncertainty of Rf', () => {
  it.each([0.12, 0.44, 0.85])('at Rf %d is what a Monte Carlo run of the marks finds', (rf) => {
    const random = seededRandom(20261201);
    const [baseline, front] = [88, 28];
    const spot = { x: 21, y: baseline - rf * (baseline - front) };
    const claimed = measure(baseline, front, spot).rfUncertainty;
    const drawn = Array.from({ length: DRAWS }, () => {
      const moved = { x: spot.x, y: spot.y + u * normal(random) };
      return measure(baseline + u * normal(random), front + u * normal(random), moved).rf;
    });
    const ratio = spread(drawn) / claimed;
    process.stdout.write(`u(Rf) at ${rf}: ${claimed.toFixed(5)}, Monte Carlo over it ${ratio.toFixed(3)}\n`);
    expect(ratio).toBeGreaterThan(0.95);
    expect(ratio).toBeLessThan(1.05);
  });

  it('grows by less than a twentieth when corners are placed half a millimetre wrong: they carry all marks alike', () => {
    const random = seededRandom(7);
    const [baseline, front, spot] = [88, 28, { x: 21, y: 61.6 }];
    const claimed = measure(baseline, front, spot).rfUncertainty;
    const pxPerMm = 13;
    const drawn = Array.from({ length: 4000 }, () => {
      const shaken = corners.map(({ x, y }) => ({
        x: x + u * pxPerMm * normal(random),
        y: y + u * pxPerMm * normal(random),
      }));
      return measure(baseline, front, spot, shaken).rf;
    });
    const share = spread(drawn) / claimed;
    process.stdout.write(`Corners 0.5 mm wrong alone: ${share.toFixed(3)} of u(Rf)\n`);
    expect(share).toBeGreaterThan(0);
    expect(Math.hypot(1, share)).toBeLessThan(1.05);
  });
});
