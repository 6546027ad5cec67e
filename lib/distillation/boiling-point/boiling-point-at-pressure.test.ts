import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertPressure } from '@/lib/units/pressure';
import { antoineBoilingPointC, antoinePressureKPa, antoineReach } from './antoine';
import { boilingPointAtPressure } from './boiling-point-at-pressure';
import { maxwellBonnellBoilingPointC, maxwellBonnellErrorC, maxwellBonnellLogMmHg } from './maxwell-bonnell';
import { pressureForTemperature } from './pressure-for-temperature';
import { REFERENCE_SETS as SETS } from './reference-sets.fixture';
import type { VapourPressureData } from './vapour-pressure-data';
import { wagnerBoilingPointC, wagnerPressureKPa, wagnerRangeC } from './wagner';

const LIQUIDS: VapourPressureData[] = Object.values(SETS);
const mbar = (mmHg: number): number => convertPressure(mmHg, 'mmHg', 'mbar');
const onlyBoilingPoint = (data: VapourPressureData): VapourPressureData => ({
  ...data,
  wagner: undefined,
  antoine: undefined,
});

describe('numbers that are not a pressure or a temperature', () => {
  it.each([Number.NaN, 0, -5, 0.001, 1e6, Number.POSITIVE_INFINITY])('refuses %s mbar', (pressure) => {
    expect(() => boilingPointAtPressure(SETS.toluene, pressure)).toThrow(RangeError);
  });

  it('refuses a normal boiling point or a temperature that is not a number', () => {
    expect(() => boilingPointAtPressure({ ...SETS.toluene, normalBoilingPointC: Number.NaN }, 50)).toThrow(
      RangeError,
    );
    expect(() => pressureForTemperature(SETS.toluene, Number.NaN)).toThrow(RangeError);
  });

  it('says which temperatures can be asked for when one cannot be reached', () => {
    const answer = pressureForTemperature(SETS.toluene, 400);
    expect(answer.ok).toBe(false);
    if (!answer.ok) expect(answer.problem).toMatch(/choose a temperature between/);
  });

  it('refuses Wagner beyond the critical point and Antoine with swapped limits', () => {
    expect(() => wagnerPressureKPa(SETS.toluene.wagner, 400)).toThrow(RangeError);
    expect(() => wagnerBoilingPointC(SETS.toluene.wagner, 5000)).toThrow(RangeError);
    expect(() => antoineReach({ ...SETS.toluene.antoine, tMinC: 200, tMaxC: 10 }, 50)).toThrow(/swapped/);
    expect(() => antoineBoilingPointC(SETS.toluene.antoine, 1e9)).toThrow(RangeError);
    expect(() => antoinePressureKPa(SETS.toluene.antoine, -250)).toThrow(RangeError);
  });
});

describe('boiling points under reduced pressure', () => {
  // Values of Wagner sets (VDI Heat Atlas, PPDS) or, for cyclohexanone, of the Antoine set (Landolt-Boernstein).
  it.each([
    ['toluene', 10, 6.2],
    ['toluene', 50, 36.4],
    ['toluene', 100, 51.9],
    ['ethylbenzene', 50, 57.6],
    ['benzaldehyde', 10, 59.8],
    ['benzaldehyde', 50, 94.3],
    ['benzaldehyde', 100, 112.1],
    ['acetophenone', 50, 114.7],
    ['cyclohexanone', 50, 73.6],
    ['1-octanol', 10, 88.4],
    ['1-octanol', 50, 119.0],
    ['nitrobenzene', 10, 84],
    ['aniline', 10, 68.7],
    ['benzyl alcohol', 10, 91.9],
    ['water', 50, 38.1],
    ['water', 100, 51.5],
    ['heptane', 100, 41.8],
    ['ethyl acetate', 100, 26.1],
    ['hexane', 760, 68.7],
  ] as const)('%s at %d mmHg is %d °C within 0.5 °C', (name, pressureMmHg, expectedC) => {
    const result = boilingPointAtPressure(SETS[name], mbar(pressureMmHg));
    expect(Math.abs(result.boilingPointC - expectedC)).toBeLessThanOrEqual(0.5);
    expect(result.method).toBe(name === 'cyclohexanone' ? 'antoine' : 'wagner');
  });

  it('acetophenone at 10 mmHg is 78 °C by Antoine (Landolt-Boernstein), and the Wagner set differs openly', () => {
    const byAntoine = boilingPointAtPressure(
      { ...SETS.acetophenone, wagner: undefined } as VapourPressureData,
      mbar(10),
    );
    expect(Math.abs(byAntoine.boilingPointC - 78)).toBeLessThanOrEqual(0.5);
    const byWagner = boilingPointAtPressure(SETS.acetophenone, mbar(10));
    expect(Math.abs(byWagner.boilingPointC - 78)).toBeLessThanOrEqual(byWagner.uncertaintyC);
    expect(byWagner.notes.join(' ')).toMatch(/sources differ by 0\.9/);
  });

  it('water has a vapour pressure of 3.169 kPa at 25 °C within 0.2 % (IAPWS; from memory)', () => {
    expect(Math.abs(wagnerPressureKPa(SETS.water.wagner, 25) / 3.169 - 1)).toBeLessThan(0.002);
  });

  it('the critical point itself gives the critical pressure (definition of the equation)', () => {
    const { highC } = wagnerRangeC(SETS.toluene.wagner);
    expect(wagnerPressureKPa(SETS.toluene.wagner, highC)).toBeCloseTo(4126, 6);
  });

  it('widens the uncertainty where two published sets disagree', () => {
    const result = boilingPointAtPressure(SETS['methyl salicylate'], mbar(100));
    expect(result.uncertaintyC).toBeGreaterThan(4);
    expect(result.notes.join(' ')).toMatch(/sources differ/);
  });
});

describe('a set that contradicts the recorded normal boiling point', () => {
  it('widens the uncertainty by the gap and says so', () => {
    const data = { ...SETS.toluene, antoine: undefined, normalBoilingPointC: 113.6 };
    const result = boilingPointAtPressure(data, mbar(50));
    expect(result.uncertaintyC).toBeCloseTo(3, 1);
    expect(result.notes.join(' ')).toMatch(/113\.6 °C is recorded/);
  });
});

describe('the choice of method', () => {
  const antoineOnly: VapourPressureData = { ...SETS.benzaldehyde, wagner: undefined } as VapourPressureData;

  it('uses Antoine inside its range, and at most 5 °C beyond it with a note', () => {
    expect(boilingPointAtPressure(antoineOnly, mbar(100)).method).toBe('antoine');
    const beyond = boilingPointAtPressure(antoineOnly, mbar(45));
    expect(beyond.method).toBe('antoine');
    expect(beyond.notes.join(' ')).toMatch(/beyond the range/);
    expect(beyond.uncertaintyC).toBeGreaterThan(1);
  });

  it('reaches exactly 5 °C beyond the range, on both sides', () => {
    const set = SETS.benzaldehyde.antoine;
    expect(antoineReach(set, set.tMinC)).toBe('inside');
    expect(antoineReach(set, set.tMinC - 5)).toBe('extrapolated');
    expect(antoineReach(set, set.tMaxC + 5)).toBe('extrapolated');
    expect(antoineReach(set, set.tMinC - 5.01)).toBe('outside');
    expect(antoineReach(set, set.tMaxC + 5.01)).toBe('outside');
  });

  it('falls to Maxwell-Bonnell further out, with its larger error stated', () => {
    const far = boilingPointAtPressure(antoineOnly, mbar(10));
    expect(far.method).toBe('maxwell-bonnell');
    expect(far.uncertaintyC).toBeCloseTo(5.5, 1);
    expect(Math.abs(far.boilingPointC - 59.8)).toBeLessThan(far.uncertaintyC);
  });

  it('names the source of what it used', () => {
    expect(boilingPointAtPressure(SETS.toluene, 50).source).toMatch(/VDI/);
    expect(boilingPointAtPressure(onlyBoilingPoint(SETS.toluene), 50).source).toMatch(/Maxwell.*CRC/);
  });
});

describe('Maxwell-Bonnell', () => {
  it.each([30, 100, 200, 300, 400])('returns 760 mmHg within 0.5 % at a boiling point of %d °C', (bp) => {
    expect(Math.abs(10 ** maxwellBonnellLogMmHg(bp, bp) / 760 - 1)).toBeLessThan(0.005);
  });

  it('a liquid of 400 °C boils at 200 °C at 1.5 mmHg, near the printed nomographs (common practice)', () => {
    expect(maxwellBonnellBoilingPointC(400, 1.5)).toBeCloseTo(200, 0);
    expect(Math.abs(maxwellBonnellBoilingPointC(400, 1) - 200)).toBeLessThan(10);
  });

  it('its pieces meet within 1 % of the pressure', () => {
    // At the two joints X = 0.0022 and 0.0013 of the published equation.
    const logAt = (x: number, tbK: number): number => {
      const temperatureK = tbK / (x * (748.1 - 0.3861 * tbK) + 0.00051606 * tbK);
      return maxwellBonnellLogMmHg(temperatureK - 273.15, tbK - 273.15);
    };
    for (const joint of [0.0022, 0.0013]) {
      expect(Math.abs(logAt(joint + 1e-8, 450) - logAt(joint - 1e-8, 450))).toBeLessThan(0.005);
    }
  });

  it.each([
    [1, 6.2, 18],
    [10, 5.5, 14],
    [50, 4.4, 11],
    [100, 3.7, 9],
  ])('at %d mmHg states ±%d °C, and adds %d °C for an associated liquid', (p, plain, low) => {
    // Errors measured over the reference table against the Wagner sets.
    expect(maxwellBonnellErrorC(p, 'none')).toEqual({ addC: 0, uncertaintyC: plain });
    const associated = maxwellBonnellErrorC(p, 'other');
    expect(associated.addC).toBeCloseTo(low, 9);
    expect(associated.uncertaintyC).toBeGreaterThan(plain);
  });

  it('falls within its own stated error of Wagner for every test liquid from 1 to 760 mmHg', () => {
    for (const data of LIQUIDS.filter((l) => l.wagner && l.name !== 'methyl salicylate')) {
      for (const p of [1, 5, 10, 50, 100, 300, 760]) {
        // Water at 1 mmHg is ice, and below the range of its Wagner set.
        if (data.name === 'water' && p === 1) continue;
        const estimate = boilingPointAtPressure(onlyBoilingPoint(data), mbar(p));
        const truth = wagnerBoilingPointC(data.wagner!, mbar(p) / 10);
        expect(Math.abs(estimate.boilingPointC - truth), `${data.name} at ${p} mmHg`).toBeLessThan(
          estimate.uncertaintyC + 0.3,
        );
      }
    }
  });

  it('without the correction it reads low for water by 9 °C at 100 mmHg, with it within 1 °C', () => {
    const plain = maxwellBonnellBoilingPointC(99.97, 100);
    expect(51.5 - plain).toBeCloseTo(9, 0);
    const corrected = boilingPointAtPressure(onlyBoilingPoint(SETS.water), mbar(100));
    expect(Math.abs(corrected.boilingPointC - 51.5)).toBeLessThan(1);
    expect(corrected.notes.join(' ')).toMatch(/associates.*raised by 9/);
  });

  it('an associated liquid of unknown class is corrected too', () => {
    const data = { ...onlyBoilingPoint(SETS['1-octanol']), associationClass: undefined };
    const estimate = boilingPointAtPressure(data, mbar(10));
    expect(Math.abs(estimate.boilingPointC - 88.4)).toBeLessThan(estimate.uncertaintyC);
  });

  it('its stated error grows as the pressure sinks', () => {
    const logs = fc.double({ min: -2, max: 2.8, noNaN: true });
    fc.assert(
      fc.property(logs, logs, fc.constantFrom('none', 'alcohol', 'acid', 'other'), (a, b, kind) => {
        const low = maxwellBonnellErrorC(10 ** Math.min(a, b), kind as 'none').uncertaintyC;
        const high = maxwellBonnellErrorC(10 ** Math.max(a, b), kind as 'none').uncertaintyC;
        expect(low).toBeGreaterThanOrEqual(high - 1e-9);
      }),
    );
  });
});

describe('pressure for a wanted temperature', () => {
  const anyLiquid = fc.constantFrom(...LIQUIDS, ...LIQUIDS.map(onlyBoilingPoint));
  const pressures = fc
    .double({ min: Math.log10(0.05), max: Math.log10(1900), noNaN: true })
    .map((log) => 10 ** log);

  it('is the inverse of the boiling point', () => {
    fc.assert(
      fc.property(anyLiquid, pressures, (data, pressureMbar) => {
        const there = boilingPointAtPressure(data, pressureMbar);
        const back = pressureForTemperature(data, there.boilingPointC);
        expect(back.ok).toBe(true);
        if (!back.ok) return;
        // At the seam of two methods one temperature has two pressures, and the better method answers.
        if (back.method === there.method)
          expect(Math.abs(back.pressureMbar / pressureMbar - 1)).toBeLessThan(1e-6);
        else expect(there.method).toBe('maxwell-bonnell');
        expect(back.pressureLowMbar).toBeLessThanOrEqual(back.pressureMbar);
        expect(back.pressureHighMbar).toBeGreaterThanOrEqual(back.pressureMbar);
      }),
      { numRuns: 200 },
    );
  });

  it('the boiling point rises with pressure as long as the method stays', () => {
    fc.assert(
      fc.property(anyLiquid, pressures, fc.double({ min: 1.001, max: 2, noNaN: true }), (data, p, factor) => {
        fc.pre(p * factor < 1999);
        const low = boilingPointAtPressure(data, p);
        const high = boilingPointAtPressure(data, p * factor);
        if (low.method === high.method) expect(high.boilingPointC).toBeGreaterThan(low.boilingPointC);
      }),
    );
  });

  it('prefers the fitted set where it and the estimate share a temperature', () => {
    // Landolt-Boernstein gives this set from 131 °C on.
    const data: VapourPressureData = { ...SETS['benzyl alcohol'], wagner: undefined } as VapourPressureData;
    const there = boilingPointAtPressure(data, mbar(60));
    expect(there.method).toBe('antoine');
    const back = pressureForTemperature(data, there.boilingPointC);
    expect(back.ok && back.method).toBe('antoine');
    expect(back.ok && back.pressureMbar).toBeCloseTo(mbar(60), 6);
  });

  it('toluene boils at 36.4 °C at 50 mmHg (VDI Heat Atlas), so that temperature needs 66.7 mbar', () => {
    const answer = pressureForTemperature(SETS.toluene, 36.37);
    expect(answer.ok && answer.pressureMbar).toBeCloseTo(66.67, 1);
    expect(answer.ok && answer.method).toBe('wagner');
  });
});
