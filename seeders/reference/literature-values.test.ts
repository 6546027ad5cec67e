import { describe, expect, it } from 'vitest';
import { literatureValueProblems } from '@/lib/compounds/literature-value-problems';
import { propertyDefinition } from '@/lib/compounds/property-names';
import {
  parseReferenceLiteratureValues,
  readReferenceCompounds,
  readReferenceLiteratureValues,
} from './read-reference';

const compounds = await readReferenceCompounds();
const values = await readReferenceLiteratureValues();

function preferred(cas: string, property: string) {
  return values.find((row) => row.cas === cas && row.property === property && row.preferred);
}

describe('the reference literature values', () => {
  it('belong to a listed compound and have unit, source and every condition that they need', () => {
    const known = new Set(compounds.map(({ cas }) => cas));
    for (const row of values) {
      expect(known.has(row.cas), row.cas).toBe(true);
      expect(row.source, `${row.cas} ${row.property}`).not.toBe('');
      expect(row.unit).toBe(propertyDefinition(row.property).unit);
      expect(literatureValueProblems(row), `${row.cas} ${row.property}`).toEqual([]);
    }
  });

  it('have exactly one preferred value for each property of a compound', () => {
    const counts = new Map<string, number>();
    for (const { cas, property, preferred: kept } of values)
      counts.set(`${cas} ${property}`, (counts.get(`${cas} ${property}`) ?? 0) + Number(kept));
    for (const [key, count] of counts) expect(count, key).toBe(1);
  });

  it('give every compound a normal boiling point at 101.325 kPa', () => {
    for (const { cas } of compounds)
      expect(preferred(cas, 'normal boiling point')?.pressureKPa, cas).toBe(101.325);
  });

  it('say so where the temperature of a density is lost', () => {
    for (const row of values.filter(
      ({ property, temperatureC }) => property === 'density' && temperatureC === null,
    ))
      expect(row.note).toBe('20 or 25 °C, not kept by the data set');
  });

  it('have Antoine sets that return 101.325 kPa near the normal boiling point', () => {
    // A set is kept only where it gives the normal boiling point within 0.6 °C.
    const sets = values.filter(({ property }) => property === 'Antoine coefficients');
    expect(sets).toHaveLength(166);
    for (const { cas, coefficients } of sets) {
      const { A = 0, B = 0, C = 0 } = coefficients ?? {};
      const boilsAtC = B / (A - Math.log10(101.325)) - C;
      expect(
        Math.abs(boilsAtC - (preferred(cas, 'normal boiling point')?.value ?? 0)),
        cas,
      ).toBeLessThanOrEqual(0.61);
    }
  });

  it('have Wagner sets that return 101.325 kPa at the normal boiling point, formamide apart', () => {
    const sets = values.filter(({ property }) => property === 'Wagner coefficients');
    expect(sets).toHaveLength(105);
    for (const { cas, coefficients } of sets) {
      const {
        criticalTemperatureK = 0,
        criticalPressureKPa = 0,
        A = 0,
        B = 0,
        C = 0,
        D = 0,
      } = coefficients ?? {};
      const temperatureK = (preferred(cas, 'normal boiling point')?.value ?? 0) + 273.15;
      const x = 1 - temperatureK / criticalTemperatureK;
      const sum = A * x + B * x ** 1.5 + C * x ** 2.5 + D * x ** 5;
      const pressureKPa = criticalPressureKPa * Math.exp((sum * criticalTemperatureK) / temperatureK);
      // 5 % of pressure is about 1.5 to 2 °C at the boiling point. The published boiling points of formamide, which
      // decomposes, lie 10 °C apart.
      const tolerance = cas === '75-12-7' ? 0.08 : 0.05;
      expect(Math.abs(pressureKPa / 101.325 - 1), cas).toBeLessThan(tolerance);
    }
  });

  it('keep several boiling points where the sources disagree', () => {
    for (const cas of [
      '91-17-8',
      '5392-40-5',
      '106-22-9',
      '98-00-0',
      '102-82-9',
      '7087-68-5',
      '90-02-8',
      '75-12-7',
    ])
      expect(
        values.filter((row) => row.cas === cas && row.property === 'normal boiling point').length,
        cas,
      ).toBeGreaterThan(1);
  });

  it('agree on the refractive index at one temperature within 0.001, but for known disagreements', () => {
    // Both sets read to 20 °C with 4.5e-4 per °C (common practice for organic liquids).
    const disagreements = new Set(['91-17-8', '98-95-3', '75-15-0', '75-05-8', '127-19-5', '872-50-4']);
    for (const row of values.filter(({ property }) => property === 'refractive index')) {
      const kept = preferred(row.cas, 'refractive index');
      if (disagreements.has(row.cas) || !kept || row.cas === '7732-18-5') continue;
      const at = (value: number | null, temperatureC: number | null) =>
        (value ?? 0) + 4.5e-4 * ((temperatureC ?? 0) - 20);
      const difference = at(row.value, row.temperatureC) - at(kept.value, kept.temperatureC);
      expect(Math.abs(difference), row.cas).toBeLessThan(0.0014);
    }
  });

  it('hold water at 20 and 25 °C as the pharmacopoeia calibrates with it', () => {
    // Ph. Eur. 2.2.6; USP <831>.
    const water = values.filter(
      ({ cas, property }) => cas === '7732-18-5' && property === 'refractive index',
    );
    expect(water.map(({ value, temperatureC }) => [value, temperatureC])).toEqual([
      [1.333, 20],
      [1.3325, 25],
    ]);
  });
});

describe('reading the table of values', () => {
  const header =
    'cas\tproperty\tvalue\tcoefficients\tunit\ttemperatureC\tpressureKPa\twavelengthNm\trangeMinC\trangeMaxC\tsource\tpreferred\tnote\n';

  it('keeps the digits as published beside the number', () => {
    const [row] = parseReferenceLiteratureValues(
      `${header}64-17-5\tdensity\t0.7890\t\tg/mL\t20\t\t\t\t\tmade up\t1\t\n`,
    );
    expect(row).toMatchObject({
      value: 0.789,
      valueText: '0.7890',
      temperatureC: 20,
      pressureKPa: null,
      preferred: true,
    });
  });

  it('refuses a property outside the closed list, and a row with neither value nor coefficients', () => {
    expect(() =>
      parseReferenceLiteratureValues(`${header}64-17-5\tcolour\t1\t\t\t\t\t\t\t\ts\t1\t\n`),
    ).toThrow(/colour/);
    expect(() =>
      parseReferenceLiteratureValues(`${header}64-17-5\tdensity\t\t\t\t\t\t\t\t\ts\t1\t\n`),
    ).toThrow(/Line 2/);
  });
});
