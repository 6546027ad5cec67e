import { describe, expect, it } from 'vitest';
import {
  evaporatesFromPlate,
  findVisualiser,
  visibilityOnPlate,
  VISUALISERS,
  type StructureFeatures,
} from './visualisers';

describe('what a visualiser shows (common practice)', () => {
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
  const see = (id: string, features: Partial<StructureFeatures> | null, bp: number | null = 220) =>
    visibilityOnPlate({
      visualiser: findVisualiser(id)!,
      features: features && { ...none, ...features },
      normalBoilingPointC: bp,
    }).state;

  it('is uncertain without a structure and never assumes that something is seen', () => {
    for (const visualiser of VISUALISERS) {
      expect(see(visualiser.id, null)).toBe('uncertain');
      expect(see(visualiser.id, {})).not.toBe('sees');
    }
    expect(findVisualiser('moonlight')).toBeNull();
  });

  it.each([
    ['uv-254', { chromophore254: true }, 'sees'],
    ['uv-254', { alcohol: true, alkene: true }, 'blind'],
    ['permanganate', { alkene: true }, 'sees'],
    ['permanganate', { ketone: true }, 'blind'],
    ['iodine', { alcohol: true }, 'uncertain'],
    ['dinitrophenylhydrazine', { ketone: true }, 'sees'],
    ['dinitrophenylhydrazine', { alcohol: true }, 'blind'],
    ['ninhydrin', { primaryAmine: true }, 'sees'],
    ['ninhydrin', { secondaryAmine: true }, 'blind'],
    ['bromocresol-green', { carboxylicAcid: true }, 'sees'],
    ['ferric-chloride', { phenol: true }, 'sees'],
    ['ferric-chloride', { alcohol: true }, 'blind'],
  ] as const)('%s with %j: %s', (id, features, expected) => {
    expect(see(id, features)).toBe(expected);
  });

  it('nothing shows a compound that has left the plate: below 150 °C', () => {
    expect(see('uv-254', { chromophore254: true }, 110.6)).toBe('blind');
    expect(see('uv-254', { chromophore254: true }, 178.7)).toBe('sees');
    expect(evaporatesFromPlate(149.9)).toBe(true);
    expect(evaporatesFromPlate(150)).toBe(false);
    expect(() => evaporatesFromPlate(Number.NaN)).toThrow(RangeError);
  });
});
