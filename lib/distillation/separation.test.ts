import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { REFERENCE_SETS as SETS } from './boiling-point/reference-sets.fixture';
import { adviseSeparation, fenskeStages, planSeparation } from './separation';

const stages = (lightInDistillate: number, lightInBottoms: number, relativeVolatility: number) =>
  fenskeStages({ lightInDistillate, lightInBottoms, relativeVolatility });

describe('stages at total reflux', () => {
  it('refuses fractions of 0 or 1 or in per cent, swapped ends, and a volatility not above 1', () => {
    expect(() => stages(1, 0.05, 2.5)).toThrow(RangeError);
    expect(() => stages(95, 5, 2.5)).toThrow(RangeError);
    expect(() => stages(0.95, 0, 2.5)).toThrow(RangeError);
    expect(() => stages(0.05, 0.95, 2.5)).toThrow(/more of the light/);
    expect(() => stages(0.95, 0.05, 1)).toThrow(/swapped/);
    expect(() => stages(Number.NaN, 0.05, 2)).toThrow(RangeError);
    expect(() => stages(0.95, 0.05, Number.NaN)).toThrow(RangeError);
  });

  it('are 6.43 from 0.05 to 0.95 at a volatility of 2.5 (Fenske 1932)', () => {
    expect(stages(0.95, 0.05, 2.5)).toBeCloseTo(6.43, 2);
  });

  it('grow with the purity wanted and shrink with the volatility', () => {
    const purity = fc.double({ min: 0.6, max: 0.99, noNaN: true });
    const alpha = fc.double({ min: 1.1, max: 20, noNaN: true });
    fc.assert(
      fc.property(purity, alpha, (p, a) => {
        expect(stages(p + 0.005, 1 - p, a)).toBeGreaterThan(stages(p, 1 - p, a));
        expect(stages(p, 1 - p, a * 1.1)).toBeLessThan(stages(p, 1 - p, a));
      }),
    );
  });
});

describe('advice (common practice)', () => {
  it('goes from column over short column to simple as the gap widens', () => {
    expect(adviseSeparation(12, 1.5).technique).toBe('column');
    expect(adviseSeparation(50, 6).technique).toBe('simple or short column');
    expect(adviseSeparation(80, 15).technique).toBe('simple');
    expect(adviseSeparation(1, 1.02).technique).toBe('hardly by distillation');
    expect(() => adviseSeparation(-5, 2)).toThrow(RangeError);
    expect(() => adviseSeparation(5, Number.NaN)).toThrow(RangeError);
  });
});

describe('plan of a separation', () => {
  it('says when light and heavy are swapped, or are one liquid', () => {
    const swapped = planSeparation({ light: SETS.toluene, heavy: SETS.heptane, pressureMbar: 1013.25 });
    expect(swapped.ok).toBe(false);
    if (!swapped.ok) expect(swapped.problem).toMatch(/swap/);
    expect(planSeparation({ light: SETS.toluene, heavy: SETS.toluene, pressureMbar: 1013.25 }).ok).toBe(
      false,
    );
  });

  it('refuses purities that are no fractions and a pressure that is none', () => {
    const pair = { light: SETS.heptane, heavy: SETS.toluene };
    expect(() => planSeparation({ ...pair, pressureMbar: Number.NaN })).toThrow(RangeError);
    expect(() => planSeparation({ ...pair, pressureMbar: 1000, lightPurity: 95 })).toThrow(RangeError);
    expect(planSeparation({ ...pair, pressureMbar: 1000, lightPurity: 0.5, heavyPurity: 0.5 }).ok).toBe(
      false,
    );
  });

  it('compares vapour pressures at the mean temperature (Wagner sets, VDI Heat Atlas)', () => {
    const plan = planSeparation({ light: SETS.heptane, heavy: SETS.toluene, pressureMbar: 1013.25 });
    if (!plan.ok) throw new Error(plan.problem);
    expect(plan.differenceC).toBeCloseTo(12.2, 1);
    // Antoine sets of the Poling collection at 104.5 °C: heptane 120.8 kPa, toluene 84.9 kPa.
    expect(plan.relativeVolatility).toBeCloseTo(1.42, 2);
    expect(plan.advice.technique).toBe('column');
    expect(plan.minimumStages).toBeCloseTo(stages(0.95, 0.05, plan.relativeVolatility), 9);
    expect(plan.notes.join()).toMatch(/azeotrope/);
  });

  it('warns when the boiling points are known worse than they differ', () => {
    const bare = (name: string, normalBoilingPointC: number) => ({
      name,
      normalBoilingPointC,
      normalBoilingPointSource: 'invented for this test',
      associated: false,
    });
    const plan = planSeparation({ light: bare('one', 180), heavy: bare('other', 183), pressureMbar: 10 });
    expect(plan.ok && plan.notes.join()).toMatch(/stages are a guess/);
  });
});
