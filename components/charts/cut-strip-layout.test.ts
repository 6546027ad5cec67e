import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layoutCurve, layoutSegments, massToX, temperatureRange } from './cut-strip-layout';

const widths = (masses: (number | null)[], available: number, min: number) =>
  layoutSegments(masses, available, min).map((box) => Math.round(box.width * 1000) / 1000);

describe('the widths of a cut strip', () => {
  it('are proportional to the collected mass', () => {
    expect(widths([10, 30, 60], 1000, 44)).toEqual([100, 300, 600]);
  });

  it('keep a thin cut wide enough to hit and take the room from the others in proportion', () => {
    expect(widths([1, 99, 100], 1000, 50)).toEqual([50, 472.613, 477.387]);
  });

  it('give a receiver that is not weighed yet, or empty, the least width', () => {
    expect(widths([null, 50, 0], 500, 50)).toEqual([50, 400, 50]);
  });

  it('are all the least width when nothing is weighed, and nothing when there is no segment', () => {
    expect(widths([null, null], 500, 44)).toEqual([44, 44]);
    expect(widths([], 500, 44)).toEqual([]);
  });

  it('grow past a box that is too narrow for all the least widths', () => {
    expect(widths([5, 5, 5, 5], 100, 44)).toEqual([44, 44, 44, 44]);
  });

  it('fill the box without gaps and never fall under the least width, whatever the masses', () => {
    const mass = fc.option(fc.double({ min: 0, max: 1e4, noNaN: true }), { nil: null });
    fc.assert(
      fc.property(
        fc.array(mass, { minLength: 1, maxLength: 14 }),
        fc.integer({ min: 200, max: 1600 }),
        (masses, available) => {
          const boxes = layoutSegments(masses, available, 44);
          let x = 0;
          for (const box of boxes) {
            expect(box.x).toBeCloseTo(x, 6);
            expect(box.width).toBeGreaterThanOrEqual(44 - 1e-9);
            x += box.width;
          }
          const weighed = masses.some((m) => m !== null && m > 0);
          if (weighed && available >= 44 * masses.length) expect(x).toBeCloseTo(available, 6);
        },
      ),
    );
  });
});

describe('the curve over a cut strip', () => {
  const masses = [10, 0, 30];
  const boxes = layoutSegments(masses, 400, 50);

  it('meets the edges of the segments where the receivers were changed', () => {
    expect(massToX(0, masses, boxes)).toBe(0);
    expect(massToX(10, masses, boxes)).toBeCloseTo(boxes[0]!.width);
    expect(massToX(25, masses, boxes)).toBeCloseTo(boxes[2]!.x + boxes[2]!.width / 2);
    expect(massToX(99, masses, boxes)).toBeCloseTo(400);
  });

  it('orders its points by what was collected and drops points that say neither mass nor volume', () => {
    const curve = layoutCurve(
      [
        { collectedMassG: 40, headTemperatureC: 80 },
        { collectedMassG: 0, headTemperatureC: 60 },
        { headTemperatureC: 70 },
      ],
      masses,
      boxes,
    );
    expect(curve).toEqual([
      { x: 0, headTemperatureC: 60 },
      { x: 400, headTemperatureC: 80 },
    ]);
  });

  it('places volumes by their share of the largest', () => {
    const [half] = layoutCurve(
      [
        { volumeMl: 25, headTemperatureC: 77 },
        { volumeMl: 50, headTemperatureC: 78 },
      ],
      [40],
      [{ x: 0, width: 400 }],
    );
    expect(half!.x).toBeCloseTo(200);
  });
});

describe('the temperature axis', () => {
  it('holds every temperature, also the expected one, and spans at least 4 °C', () => {
    const [low, high] = temperatureRange(
      [{ netMassG: 1, headTemperatureFromC: 77, headTemperatureToC: 77.2 }],
      [],
      77.1,
    )!;
    expect(low).toBeLessThan(77);
    expect(high).toBeGreaterThan(77.2);
    expect(high - low).toBeGreaterThanOrEqual(4);
  });

  it('is absent when no temperature is known', () => {
    expect(
      temperatureRange([{ netMassG: 1, headTemperatureFromC: null, headTemperatureToC: null }], []),
    ).toBeNull();
  });
});
