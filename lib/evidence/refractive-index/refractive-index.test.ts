import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { correctIndex, isSodiumD } from './correct-index';
import { decideDifference } from './decide';
import { mixtureIndex, volumeFractionFromIndex } from './lorentz-lorenz';
import { smallestVisible } from './smallest-visible';
import { indexBudget, replicateStatistics } from './uncertainty';
import { checkWater, waterIndex } from './water-check';

describe('numbers that are no refractive index', () => {
  it.each([Number.NaN, -1.37, 0, 1, 13.7, Number.POSITIVE_INFINITY])('refuses %s', (n) => {
    expect(() => correctIndex({ n, temperatureC: 20, toTemperatureC: 20 })).toThrow(RangeError);
    expect(() => replicateStatistics([1.37, n])).toThrow(/Reading 2/);
    expect(() => smallestVisible({ nTarget: 1.37, nImpurity: n, tolerance: 0.0005 })).toThrow(RangeError);
  });

  it('refuses an index and a temperature in each other’s place, no readings, and a coefficient of the wrong sign', () => {
    expect(() => correctIndex({ n: 27.3, temperatureC: 1.369, toTemperatureC: 20 })).toThrow(RangeError);
    expect(() => replicateStatistics([])).toThrow(/at least one/);
    expect(() => correctIndex({ n: 1.37, temperatureC: 25, toTemperatureC: 20, fallPerC: -4.5e-4 })).toThrow(
      RangeError,
    );
    expect(() => correctIndex({ n: 1.37, temperatureC: Number.NaN, toTemperatureC: 20 })).toThrow(RangeError);
  });
});

describe('temperature correction', () => {
  it('carries 1.3690 at 27.3 °C to 1.3723 at 20 °C (4.5e-4 per °C, common practice)', () => {
    expect(correctIndex({ n: 1.369, temperatureC: 27.3, toTemperatureC: 20 })).toBeCloseTo(1.3723, 4);
  });

  it("carries to the literature's temperature with the compound's own coefficient", () => {
    expect(correctIndex({ n: 1.5, temperatureC: 20, toTemperatureC: 30, fallPerC: 6e-4 })).toBeCloseTo(
      1.494,
      9,
    );
  });

  it('there and back is where one was', () => {
    const t = fc.double({ min: 5, max: 60, noNaN: true });
    fc.assert(
      fc.property(fc.double({ min: 1.3, max: 1.7, noNaN: true }), t, t, (n, a, b) => {
        const there = correctIndex({ n, temperatureC: a, toTemperatureC: b });
        expect(correctIndex({ n: there, temperatureC: b, toTemperatureC: a })).toBeCloseTo(n, 12);
      }),
    );
  });

  it('knows the sodium D line, 589.3 nm', () => {
    expect(isSodiumD(589.3)).toBe(true);
    expect(isSodiumD(589)).toBe(true);
    expect(isSodiumD(632.8)).toBe(false);
    expect(() => isSodiumD(Number.NaN)).toThrow(RangeError);
  });
});

describe('check of the instrument with water', () => {
  it('refuses water far from room temperature', () => {
    expect(() => waterIndex(60)).toThrow(RangeError);
    expect(() => waterIndex(Number.NaN)).toThrow(RangeError);
  });

  it('expects 1.3330 at 20 °C and 1.3325 at 25 °C (Ph. Eur. 2.2.6; USP <831>)', () => {
    expect(waterIndex(20)).toBeCloseTo(1.333, 6);
    expect(waterIndex(25)).toBeCloseTo(1.3325, 6);
  });

  it('warns over 0.0002 and proves nothing over 0.0005, either way', () => {
    const state = (reading: number) => checkWater({ reading, temperatureC: 20 }).state;
    expect(state(1.3332)).toBe('good');
    expect(state(1.3328)).toBe('good');
    expect(state(1.3333)).toBe('warning');
    expect(state(1.3325)).toBe('warning');
    expect(state(1.3336)).toBe('inconclusive');
    expect(state(1.3324)).toBe('inconclusive');
  });
});

describe('uncertainty budget (JCGM 100:2008)', () => {
  it('has a row for each source and combines them by the root of squares', () => {
    const budget = indexBudget({
      readings: [1.3689, 1.369, 1.3691],
      temperatureC: 27.3,
      literatureTemperatureC: 20,
    });
    expect(budget.meanN).toBeCloseTo(1.369, 9);
    expect(budget.standardDeviation).toBeCloseTo(1e-4, 9);
    const of = (source: string) => budget.rows.find((row) => row.source === source)!.standardUncertainty;
    expect(of('repeatability')).toBeCloseTo(1e-4 / Math.sqrt(3), 10);
    expect(of('resolution')).toBeCloseTo(0.5e-4 / Math.sqrt(3), 10);
    expect(of('temperature')).toBeCloseTo(0.45e-4, 10);
    expect(of('temperature coefficient')).toBeCloseTo(3.65e-4, 10);
    expect(of('literature')).toBeCloseTo(2e-4 / Math.sqrt(3), 10);
    // By hand: sqrt(0.577^2 + 0.289^2 + 0.45^2 + 3.65^2 + 1.155^2) = 3.910, in 1e-4.
    expect(budget.combinedStandardUncertainty).toBeCloseTo(3.91e-4, 6);
    expect(budget.expandedUncertainty).toBeCloseTo(2 * budget.combinedStandardUncertainty, 12);
  });

  it('says that one reading cannot show repeatability', () => {
    const budget = indexBudget({ readings: [1.369], temperatureC: 20, literatureTemperatureC: 20 });
    expect(budget.standardDeviation).toBeNull();
    expect(budget.rows.some((row) => row.source === 'repeatability')).toBe(false);
    expect(budget.notes.join()).toMatch(/three times/);
  });

  it('refuses a negative uncertainty', () => {
    expect(() =>
      indexBudget({
        readings: [1.369],
        temperatureC: 20,
        literatureTemperatureC: 20,
        temperatureUncertaintyC: -1,
      }),
    ).toThrow(RangeError);
  });
});

describe('decision (JCGM 106:2012)', () => {
  const decide = (difference: number, expandedUncertainty: number, rule: 'guarded' | 'simple') =>
    decideDifference({ difference, expandedUncertainty, tolerance: 0.0005, rule }).state;

  it('refuses what is no difference, tolerance or uncertainty', () => {
    expect(() => decide(Number.NaN, 0.0001, 'guarded')).toThrow(RangeError);
    expect(() => decide(0, -0.0001, 'simple')).toThrow(RangeError);
    expect(() =>
      decideDifference({ difference: 0, expandedUncertainty: 0, tolerance: 0, rule: 'simple' }),
    ).toThrow(RangeError);
  });

  it('guarded: passes with, fails without, and says when it cannot tell', () => {
    expect(decide(0.0003, 0.0002, 'guarded')).toBe('pass');
    expect(decide(-0.0003, 0.0002, 'guarded')).toBe('pass');
    expect(decide(0.0004, 0.0002, 'guarded')).toBe('inconclusive');
    expect(decide(0.0007, 0.0002, 'guarded')).toBe('inconclusive');
    expect(decide(-0.0008, 0.0002, 'guarded')).toBe('fail');
  });

  it('simple: decides on the difference alone, whatever the uncertainty, and warns of a large one (JCGM 106:2012, 8.2)', () => {
    expect(decide(0.0005, 0.0004, 'simple')).toBe('pass');
    expect(decide(0.0006, 0.0004, 'simple')).toBe('fail');
    expect(decide(0.0001, 0.0006, 'simple')).toBe('pass');
    expect(decide(0.0006, 0.0006, 'simple')).toBe('fail');
    const wide = { difference: 0.0001, expandedUncertainty: 0.0006, tolerance: 0.0005 };
    expect(decideDifference({ ...wide, rule: 'simple' }).reason).toContain('larger than the tolerance');
  });

  it('never gets better as the difference grows', () => {
    const rank = { pass: 0, inconclusive: 1, fail: 2 };
    const d = fc.double({ min: 0, max: 0.003, noNaN: true });
    fc.assert(
      fc.property(
        d,
        d,
        fc.double({ min: 0, max: 0.002, noNaN: true }),
        fc.constantFrom('guarded', 'simple'),
        (a, b, u, rule) => {
          const near = decide(Math.min(a, b), u, rule as 'guarded');
          const far = decide(-Math.max(a, b), u, rule as 'guarded');
          expect(rank[far]).toBeGreaterThanOrEqual(rank[near]);
        },
      ),
    );
  });
});

describe('mixtures by Lorentz-Lorenz', () => {
  it('half toluene (1.4969) and half heptane (1.3878) by volume is 1.4413', () => {
    expect(mixtureIndex(1.4969, 1.3878, 0.5)).toBeCloseTo(1.4413, 4);
  });

  it('refuses a fraction outside 0 to 1', () => {
    expect(() => mixtureIndex(1.4969, 1.3878, 1.1)).toThrow(RangeError);
    expect(() => mixtureIndex(1.4969, 1.3878, Number.NaN)).toThrow(RangeError);
  });

  it('finds the fraction back', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), (share) => {
        const estimate = volumeFractionFromIndex({
          nMixture: mixtureIndex(1.4969, 1.3878, share),
          nFirst: 1.4969,
          nSecond: 1.3878,
        });
        expect(estimate.ok && estimate.volumeFraction).toBeCloseTo(share, 9);
      }),
    );
  });

  it('gives the uncertainty that moving the reading shows (numerical derivative)', () => {
    const at = (nMixture: number) =>
      volumeFractionFromIndex({
        nMixture,
        nFirst: 1.4969,
        nSecond: 1.3878,
        uFirst: 0,
        uSecond: 0,
        uMixture: 0.0002,
      });
    const here = at(1.4413);
    const up = at(1.4415);
    expect(here.ok && up.ok).toBe(true);
    if (here.ok && up.ok) {
      expect(here.uncertainty).toBeCloseTo(Math.abs(up.volumeFraction - here.volumeFraction), 5);
    }
  });

  it('says so when the two liquids look alike, or when no mixture of them fits', () => {
    const alike = volumeFractionFromIndex({ nMixture: 1.43, nFirst: 1.43, nSecond: 1.4301 });
    expect(alike.ok).toBe(false);
    const foreign = volumeFractionFromIndex({ nMixture: 1.6, nFirst: 1.4969, nSecond: 1.3878 });
    expect(foreign.ok).toBe(false);
    if (!foreign.ok) expect(foreign.problem).toMatch(/something else/);
  });
});

describe('what the index can see', () => {
  // Sums by Lorentz-Lorenz; indices at 20 °C as stated.
  it('sees 0.33 vol % of 1.5335 in 1.3749 at a tolerance of 0.0005', () => {
    const result = smallestVisible({ nTarget: 1.3749, nImpurity: 1.5335, tolerance: 0.0005 });
    expect(result.volumePercent).toBeCloseTo(0.33, 1);
    expect(Math.abs(result.volumePercent! - 0.33)).toBeLessThan(0.02);
  });

  it('sees 1.3 vol % of heptane (1.3878) in cyclohexane (1.4262)', () => {
    const result = smallestVisible({ nTarget: 1.4262, nImpurity: 1.3878, tolerance: 0.0005 });
    expect(Math.abs(result.volumePercent! - 1.3)).toBeLessThan(0.05);
  });

  it('is blind to an impurity of the same index', () => {
    expect(smallestVisible({ nTarget: 1.4262, nImpurity: 1.4262, tolerance: 0.0005 }).state).toBe('blind');
    expect(smallestVisible({ nTarget: 1.4262, nImpurity: 1.4266, tolerance: 0.0005 }).state).toBe('blind');
  });
});
