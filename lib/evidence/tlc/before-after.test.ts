import { describe, expect, it } from 'vitest';
import { compareBeforeAfter, listUnseeable, type PlateCompound } from './before-after';
import type { ComparedLane } from './compare-lanes';
import type { StructureFeatures } from './visualisers';

const none: StructureFeatures = {
  chromophore254: false,
  alkene: false,
  alkyne: false,
  alcohol: false,
  aldehyde: false,
  ketone: false,
  phenol: false,
  thiol: false,
  sulfide: false,
  primaryAmine: false,
  secondaryAmine: false,
  carboxylicAcid: false,
};
// Normal boiling points: CRC Handbook of Chemistry and Physics, rounded.
const acetophenone: PlateCompound = {
  id: 'a',
  name: 'acetophenone',
  isTarget: true,
  features: { ...none, chromophore254: true, ketone: true },
  normalBoilingPointC: 202,
};
const octanol: PlateCompound = {
  id: 'o',
  name: 'octan-1-ol',
  isTarget: false,
  features: { ...none, alcohol: true },
  normalBoilingPointC: 195,
};
const toluene: PlateCompound = {
  id: 't',
  name: 'toluene',
  isTarget: false,
  features: { ...none, chromophore254: true },
  normalBoilingPointC: 111,
};
const lane = (
  label: string,
  kind: 'crude' | 'fraction',
  rfs: number[],
  dilutionPercent: number | null = null,
): ComparedLane => ({
  id: label,
  label,
  subject: kind === 'crude' ? { kind } : { kind, code: 'D-1' },
  dilutionPercent,
  spots: rfs.map((rf) => ({ rf, rfUncertainty: 0.012 })),
});

describe('the crude against a fraction', () => {
  it('tells what disappeared, stayed and is new', () => {
    const [result] = compareBeforeAfter(
      [lane('C', 'crude', [0.2, 0.44, 0.71]), lane('F', 'fraction', [0.45, 0.9])],
      'uv-254',
      [acetophenone],
    );
    expect(result!.disappeared.map((one) => one.rf)).toEqual([0.2, 0.71]);
    expect(result!.stayed).toEqual([{ crudeSpotIndex: 1, fractionSpotIndex: 0, rf: 0.45 }]);
    expect(result!.appeared).toEqual([{ spotIndex: 1, rf: 0.9 }]);
    expect(result!.words[0]).toContain('the spots at Rf 0.20, 0.71');
    expect(result!.words[0]).toContain('not absent');
    expect(result!.notSeeable).toEqual([]);
  });

  it('pairs each spot once, the nearest first', () => {
    const [result] = compareBeforeAfter(
      [lane('C', 'crude', [0.44, 0.46]), lane('F', 'fraction', [0.455])],
      'uv-254',
      [],
    );
    expect(result!.stayed).toEqual([{ crudeSpotIndex: 1, fractionSpotIndex: 0, rf: 0.455 }]);
    expect(result!.disappeared.map((one) => one.rf)).toEqual([0.44]);
  });

  it('leaves diluted crude lanes out, and an empty crude proves nothing', () => {
    const lanes = [lane('C', 'crude', []), lane('C1', 'crude', [0.4], 1), lane('F', 'fraction', [])];
    const results = compareBeforeAfter(lanes, 'uv-254', []);
    expect(results.map((one) => one.crude.label)).toEqual(['C']);
    expect(results[0]!.words).toEqual([
      'The crude in lane C shows nothing under UV 254 nm: nothing can be said to have disappeared.',
    ]);
  });
});

describe('what could not have been seen', () => {
  it('is what has no chromophore under UV, and what has left the plate, each with its reason', () => {
    const list = listUnseeable('uv-254', [acetophenone, octanol, toluene]);
    expect(list.map((one) => [one.compound.name, one.state])).toEqual([
      ['octan-1-ol', 'blind'],
      ['toluene', 'blind'],
    ]);
    expect(list[0]!.reason).toContain('chromophore');
    expect(list[1]!.reason).toContain('111 °C');
  });

  it('is nothing that its own reference shows in the same photo', () => {
    const reference: ComparedLane = {
      id: 'R',
      label: 'R',
      subject: { kind: 'reference', compound: { id: 't', name: 'toluene' } },
      spots: [{ rf: 0.8, rfUncertainty: 0.012 }],
    };
    const lanes = [lane('C', 'crude', [0.4]), lane('F', 'fraction', [0.4]), reference];
    const names = (given: ComparedLane[]) =>
      compareBeforeAfter(given, 'uv-254', [octanol, toluene])[0]!.notSeeable.map((one) => one.compound.name);
    expect(names(lanes)).toEqual(['octan-1-ol']);
    expect(names([...lanes.slice(0, 2), { ...reference, spots: [] }])).toEqual(['octan-1-ol', 'toluene']);
  });

  it('is doubtful without a boiling point, a structure or a known visualiser', () => {
    const doubtful = (visualiser: string, change: Partial<PlateCompound>) =>
      listUnseeable(visualiser, [{ ...acetophenone, ...change }]).map((one) => one.state);
    expect(doubtful('uv-254', { normalBoilingPointC: null })).toEqual(['uncertain']);
    expect(doubtful('uv-254', { features: null })).toEqual(['uncertain']);
    expect(doubtful('curcumin', {})).toEqual(['uncertain']);
    expect(doubtful('uv-254', {})).toEqual([]);
  });
});
