import { describe, expect, it } from 'vitest';
import { findAzeotropes, listAzeotropes, listAzeotropesOf } from './azeotropes';

const ETHANOL = '64-17-5';
const WATER = '7732-18-5';
const ETHYL_ACETATE = '141-78-6';

describe('azeotropes', () => {
  it('knows ethanol and water in either order', () => {
    // CRC Handbook, azeotropic data (from memory): 78.2 °C, 95.6 % ethanol.
    expect(findAzeotropes(ETHANOL, WATER)).toMatchObject([
      { massPercentA: 95.6, massPercentB: 4.4, boilingPointC: 78.2, kind: 'minimum', twoLayers: false },
    ]);
    expect(findAzeotropes(WATER, ETHANOL)).toMatchObject([
      { casA: WATER, massPercentA: 4.4, massPercentB: 95.6 },
    ]);
  });

  it('knows what hides in recovered ethyl acetate', () => {
    expect(findAzeotropes(ETHYL_ACETATE, ETHANOL)).toMatchObject([{ boilingPointC: 71.8, massPercentA: 69 }]);
    expect(findAzeotropes(ETHYL_ACETATE, WATER)).toMatchObject([{ boilingPointC: 70.4, twoLayers: true }]);
  });

  it('knows none for a pair that has none, and none for a compound with itself', () => {
    // Benzene and toluene are the textbook example of a nearly ideal pair.
    expect(findAzeotropes('71-43-2', '108-88-3')).toEqual([]);
    expect(findAzeotropes(WATER, WATER)).toEqual([]);
  });

  it('lists the azeotropes of a compound with that compound first', () => {
    const ofWater = listAzeotropesOf(WATER);
    expect(ofWater.length).toBeGreaterThan(40);
    expect(ofWater.every(({ casA }) => casA === WATER)).toBe(true);
  });

  it('names each pair once, with a composition between the pure liquids and a source', () => {
    const pairs = listAzeotropes().map(({ casA, casB }) => [casA, casB].sort().join(' '));
    expect(new Set(pairs).size).toBe(pairs.length);
    for (const { massPercentA, massPercentB, source } of listAzeotropes()) {
      expect(massPercentA).toBeGreaterThan(0);
      expect(massPercentB).toBeGreaterThan(0);
      expect(massPercentA + massPercentB).toBeCloseTo(100, 6);
      expect(source).toContain('from memory');
    }
  });
});
