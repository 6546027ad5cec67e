import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareRf } from './agree';
import { inferDirection } from './polyline';
import { computeRf, type RfInput } from './rf';

const mm = (b: number, f: number, s: number): RfInput => ({
  units: 'mm',
  baseline: [{ x: 0, y: b }],
  front: [{ x: 0, y: f }],
  spot: { x: 12, y: s },
});
const px: RfInput = {
  units: 'px',
  baseline: [
    { x: 0, y: 900 },
    { x: 400, y: 900 },
  ],
  front: [
    { x: 0, y: 100 },
    { x: 400, y: 100 },
  ],
  spot: { x: 200, y: 500 },
};
const good = (input: RfInput) => {
  const result = computeRf(input);
  if (!result.ok) throw new Error(result.problem);
  return result;
};
const fieldOf = (input: RfInput): string => {
  const result = computeRf(input);
  return result.ok ? 'accepted' : result.field;
};

describe('marks that give no Rf', () => {
  it('refuses swapped lines on a photo and says how to put it right', () => {
    const result = computeRf({ ...px, baseline: px.front, front: px.baseline });
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.problem).toMatch(/swapped.*turn the photo/);
  });

  it('refuses a front on the baseline', () => {
    expect(fieldOf({ ...px, front: px.baseline })).toBe('front');
    expect(fieldOf(mm(10, 10, 10))).toBe('front');
  });

  it('refuses lines that cross at the lane', () => {
    const front = [
      { x: 0, y: 100 },
      { x: 400, y: 1000 },
    ];
    expect(fieldOf({ ...px, front, spot: { x: 390, y: 905 } })).toBe('front');
  });

  it('refuses a spot outside 0 to 1 beyond its uncertainty, and a spot off the plate', () => {
    expect(fieldOf({ ...px, spot: { x: 200, y: 960 } })).toBe('spot');
    expect(fieldOf({ ...px, spot: { x: 200, y: 50 } })).toBe('spot');
    expect(fieldOf({ ...px, spot: { x: 500, y: 500 }, extent: { width: 400, height: 1000 } })).toBe('spot');
    expect(fieldOf({ ...px, spot: { x: -1, y: 500 }, extent: { width: 400, height: 1000 } })).toBe('spot');
  });

  it('refuses positions that are no numbers, too few or too many points, and a bad scale', () => {
    expect(fieldOf({ ...px, spot: { x: Number.NaN, y: 1 } })).toBe('spot');
    expect(fieldOf({ ...px, baseline: [] })).toBe('baseline');
    expect(fieldOf({ ...px, front: Array.from({ length: 6 }, (_, i) => ({ x: i, y: 100 })) })).toBe('front');
    expect(fieldOf({ ...px, front: [{ x: 0, y: Number.POSITIVE_INFINITY }] })).toBe('front');
    expect(fieldOf({ ...px, scaleMmPerUnit: 0 })).toBe('scale');
    expect(fieldOf({ ...px, uSpot: -1 })).toBe('scale');
  });

  it('refuses a line drawn along the lanes', () => {
    const baseline = [
      { x: 200, y: 900 },
      { x: 200, y: 100 },
    ];
    expect(fieldOf({ ...px, baseline })).toBe('baseline');
  });
});

describe('retardation factor', () => {
  it('is 0.44 with u 0.0123 for b 10, f 60, s 32 mm and 0.5 mm marks (JCGM 100:2008, 5.1.2)', () => {
    const result = good(mm(10, 60, 32));
    expect(result.rf).toBeCloseTo(0.44, 9);
    expect(result.hRf).toBeCloseTo(44, 9);
    expect(result.rfUncertainty).toBeCloseTo(0.0123, 4);
    expect(result.developedDistanceMm).toBeCloseTo(50, 9);
    expect(result.flags).toEqual([]);
  });

  it('in millimetres is the same whichever edge y was measured from', () => {
    expect(good(mm(90, 40, 68)).rf).toBeCloseTo(0.44, 9);
  });

  it('takes both lines at the lane itself when they are tilted (geometry)', () => {
    const baseline = [
      { x: 0, y: 900 },
      { x: 400, y: 940 },
    ];
    const front = [
      { x: 0, y: 120 },
      { x: 400, y: 80 },
    ];
    // At x = 100 the baseline is at 910 and the front at 110: 400 of 800.
    expect(good({ ...px, baseline, front, spot: { x: 100, y: 510 } }).rf).toBeCloseTo(0.5, 9);
  });

  it('follows a front drawn through five points and extends its end pieces', () => {
    const front = [
      { x: 300, y: 100 },
      { x: 100, y: 100 },
      { x: 200, y: 80 },
      { x: 150, y: 85 },
      { x: 250, y: 85 },
    ];
    expect(good({ ...px, front, spot: { x: 200, y: 490 } }).rf).toBeCloseTo(410 / 820, 9);
    expect(good({ ...px, front, spot: { x: 50, y: 507.5 } }).rf).toBeCloseTo(392.5 / 785, 9);
  });

  it('does not change when the whole plate is photographed askew, nor does its developed distance', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -0.6, max: 0.6, noNaN: true }),
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        (angle, rf) => {
          const turn = (x: number, y: number) => ({
            x: x * Math.cos(angle) - y * Math.sin(angle),
            y: x * Math.sin(angle) + y * Math.cos(angle),
          });
          const result = good({
            units: 'px',
            baseline: [turn(0, 900), turn(400, 900)],
            front: [turn(0, 100), turn(400, 100)],
            spot: turn(200, 900 - 800 * rf),
          });
          expect(result.rf).toBeCloseTo(rf, 9);
          expect(result.developedDistance).toBeCloseTo(800, 6);
        },
      ),
    );
  });

  it('can be told that the photo lies on its side or stands on its head', () => {
    const sideways: RfInput = {
      units: 'px',
      direction: 'right',
      baseline: [{ x: 100, y: 0 }],
      front: [{ x: 900, y: 0 }],
      spot: { x: 300, y: 50 },
    };
    expect(good(sideways).rf).toBeCloseTo(0.25, 9);
    expect(
      good({ ...px, direction: 'down', baseline: px.front, front: px.baseline, spot: { x: 1, y: 300 } }).rf,
    ).toBe(0.25);
    expect(
      inferDirection(
        [
          { x: 100, y: 0 },
          { x: 100, y: 400 },
        ],
        [
          { x: 900, y: 0 },
          { x: 900, y: 400 },
        ],
      ),
    ).toBe('right');
    expect(inferDirection(px.baseline, px.front)).toBe('up');
  });

  it('falls steadily as the spot is marked lower', () => {
    const y = fc.double({ min: 100, max: 900, noNaN: true });
    fc.assert(
      fc.property(y, y, (a, b) => {
        fc.pre(Math.abs(a - b) > 1e-6);
        const high = good({ ...px, spot: { x: 200, y: Math.min(a, b) } });
        const low = good({ ...px, spot: { x: 200, y: Math.max(a, b) } });
        expect(high.rf).toBeGreaterThan(low.rf);
      }),
    );
  });
});

describe('what is flagged', () => {
  it('a photo without corners or scale, with 1 % of the developed distance as the mark uncertainty', () => {
    const result = good(px);
    expect(result.flags).toEqual(['perspective not corrected', 'scale not known']);
    expect(result.rfUncertainty).toBeCloseTo(Math.sqrt(1 + 0.25 + 0.25) * 0.01, 9);
    expect(result.developedDistanceMm).toBeNull();
  });

  it('a scale gives millimetres and the 0.5 mm marks', () => {
    const result = good({ ...px, scaleMmPerUnit: 0.0625, perspectiveCorrected: true });
    expect(result.developedDistanceMm).toBeCloseTo(50, 9);
    expect(result.rfUncertainty).toBeCloseTo((Math.sqrt(1.5) * 0.5) / 50, 9);
    expect(result.flags).toEqual([]);
  });

  it('a development under 20 mm, and not one of 20 mm', () => {
    expect(good(mm(10, 29, 20)).flags).toContain('development under 20 mm');
    expect(good(mm(10, 30, 20)).flags).not.toContain('development under 20 mm');
  });

  it('little separation, a streak, a spot at the origin or at the front', () => {
    expect(good(mm(10, 60, 14.5)).flags).toContain('little separated');
    expect(good(mm(10, 60, 56)).flags).toContain('little separated');
    expect(good({ ...mm(10, 60, 30), shape: 'streak' }).flags).toEqual(['streak']);
    expect(good(mm(10, 60, 10.2)).flags).toContain('spot at the origin');
    expect(good(mm(10, 60, 9.6)).flags).toContain('spot at the origin');
    expect(good(mm(10, 60, 59.8)).flags).toContain('spot at the front');
    expect(good(mm(10, 60, 14.5)).flags).not.toContain('spot at the origin');
  });
});

describe('two lanes', () => {
  it('refuse numbers that are none', () => {
    expect(() =>
      compareRf({ rf: Number.NaN, rfUncertainty: 0.01 }, { rf: 0.4, rfUncertainty: 0.01 }, true),
    ).toThrow(RangeError);
    expect(() =>
      compareRf({ rf: 0.4, rfUncertainty: -0.01 }, { rf: 0.4, rfUncertainty: 0.01 }, true),
    ).toThrow(RangeError);
  });

  it('agree within twice the root of the summed squares of their uncertainties (JCGM 100:2008)', () => {
    const u = 0.0123;
    const limit = 2 * Math.SQRT2 * u;
    expect(
      compareRf({ rf: 0.44, rfUncertainty: u }, { rf: 0.44 + limit - 1e-6, rfUncertainty: u }, true).state,
    ).toBe('agree');
    expect(
      compareRf({ rf: 0.44, rfUncertainty: u }, { rf: 0.44 + limit + 1e-6, rfUncertainty: u }, true).state,
    ).toBe('differ');
  });

  it('on different plates are shown and never judged (Ph. Eur. 2.2.27)', () => {
    const result = compareRf({ rf: 0.44, rfUncertainty: 0.01 }, { rf: 0.44, rfUncertainty: 0.01 }, false);
    expect(result.state).toBe('not judged');
    expect(result.difference).toBe(0);
  });
});
