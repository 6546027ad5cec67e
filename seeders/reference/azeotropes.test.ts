import { describe, expect, it } from 'vitest';
import { listAzeotropes } from '@/lib/distillation/azeotropes';
import { readReferenceCompounds, readReferenceLiteratureValues } from './read-reference';

const WATER = '7732-18-5';
const compounds = new Map((await readReferenceCompounds()).map((compound) => [compound.cas, compound]));
const values = await readReferenceLiteratureValues();

function boilingPointC(cas: string): number {
  const row = values.find(
    (value) => value.cas === cas && value.property === 'normal boiling point' && value.preferred,
  );
  if (row?.value == null) throw new Error(`${cas} has no boiling point.`);
  return row.value;
}

/** Vapour pressure by the Antoine set, in kPa; null where there is none. */
function vapourPressureKPa(cas: string, temperatureC: number): number | null {
  const row = values.find((value) => value.cas === cas && value.property === 'Antoine coefficients');
  const { A, B, C } = row?.coefficients ?? {};
  if (A === undefined || B === undefined || C === undefined) return null;
  return 10 ** (A - B / (temperatureC + C));
}

describe('azeotropes against the reference table', () => {
  it('have components of the table', () => {
    for (const { casA, casB } of listAzeotropes())
      expect([casA, casB].filter((cas) => !compounds.has(cas))).toEqual([]);
  });

  it('boil below both components, or above both where they are maximum azeotropes', () => {
    for (const { casA, casB, boilingPointC: azeotropeC, kind } of listAzeotropes()) {
      const pure = [boilingPointC(casA), boilingPointC(casB)];
      if (kind === 'minimum') expect(azeotropeC, `${casA} ${casB}`).toBeLessThan(Math.min(...pure));
      else expect(azeotropeC, `${casA} ${casB}`).toBeGreaterThan(Math.max(...pure));
    }
  });

  it('follow the sum of the two vapour pressures where the liquids do not mix', () => {
    // Liquids that do not mix boil where p(A) + p(B) is the outer pressure, and distil as p(A) M(A) : p(B) M(B).
    const immiscible = [
      '110-54-3',
      '142-82-5',
      '110-82-7',
      '71-43-2',
      '108-88-3',
      '100-41-4',
      '108-38-3',
      '108-90-7',
      '56-23-5',
      '79-01-6',
      '127-18-4',
    ];
    let compared = 0;
    for (const { casA, casB, massPercentA, boilingPointC: azeotropeC } of listAzeotropes()) {
      if (casB !== WATER || !immiscible.includes(casA)) continue;
      const pressureA = vapourPressureKPa(casA, azeotropeC);
      const pressureB = vapourPressureKPa(WATER, azeotropeC);
      if (pressureA === null || pressureB === null) continue;
      compared += 1;
      // 6 % of pressure is about 1.5 °C.
      expect(Math.abs((pressureA + pressureB) / 101.325 - 1), casA).toBeLessThan(0.06);
      const massA = pressureA * (compounds.get(casA)?.molarMassGMol ?? 0);
      const massB = pressureB * (compounds.get(WATER)?.molarMassGMol ?? 0);
      expect(Math.abs((100 * massA) / (massA + massB) - massPercentA), casA).toBeLessThan(3);
    }
    expect(compared).toBeGreaterThanOrEqual(8);
  });
});
