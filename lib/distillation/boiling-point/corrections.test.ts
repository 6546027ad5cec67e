import { describe, expect, it } from 'vitest';
import { associationClassOfSmiles, associationFeaturesOf } from './associates';
import { emergentStemCorrectionC } from './emergent-stem';
import { readSmiles } from './smiles-graph';
import { barometricCorrectionC } from './sydney-young';

describe('barometric correction', () => {
  it('refuses pressures that are no barometer and numbers that are none', () => {
    for (const pressureMmHg of [50, 900, Number.NaN, -760]) {
      expect(() => barometricCorrectionC({ temperatureC: 80, pressureMmHg, associated: false })).toThrow(
        RangeError,
      );
    }
  });

  it('adds 0.85 °C to 80.1 °C at 740 mmHg (Sydney Young)', () => {
    expect(barometricCorrectionC({ temperatureC: 80.1, pressureMmHg: 740, associated: false })).toBeCloseTo(
      0.85,
      2,
    );
  });

  it('is smaller for a liquid that associates, and negative above 760 mmHg', () => {
    expect(barometricCorrectionC({ temperatureC: 80.1, pressureMmHg: 740, associated: true })).toBeCloseTo(
      0.707,
      2,
    );
    expect(barometricCorrectionC({ temperatureC: 80.1, pressureMmHg: 770, associated: false })).toBeLessThan(
      0,
    );
  });
});

describe('emergent stem correction', () => {
  it('refuses a negative thread and numbers that are none', () => {
    expect(() =>
      emergentStemCorrectionC({ emergentThreadC: -1, readingC: 150, stemTemperatureC: 40 }),
    ).toThrow(RangeError);
    expect(() =>
      emergentStemCorrectionC({ emergentThreadC: 60, readingC: Number.NaN, stemTemperatureC: 40 }),
    ).toThrow(RangeError);
  });

  it('adds 1.06 °C for a thread of 60 °C at 150 °C with the stem at 40 °C (mercury in glass, common practice)', () => {
    expect(emergentStemCorrectionC({ emergentThreadC: 60, readingC: 150, stemTemperatureC: 40 })).toBeCloseTo(
      1.056,
      6,
    );
  });
});

describe('does a liquid associate', () => {
  it.each(['', 'C(', 'C1CC', 'hello', 'C)', '[Xx', 'C='])('does not guess at %j', (smiles) => {
    expect(associationClassOfSmiles(smiles)).toBeUndefined();
  });

  // Structures as in PubChem's SMILES of these liquids; the classes are textbook chemistry.
  it.each([
    ['water', 'O', 'other'],
    ['ethanol', 'CCO', 'alcohol'],
    ['ethanol, written backwards', 'OCC', 'alcohol'],
    ['2-methoxyethanol', 'COCCO', 'alcohol'],
    ['glycerol', 'C(C(CO)O)O', 'alcohol'],
    ['benzyl alcohol', 'C1=CC=C(C=C1)CO', 'alcohol'],
    ['tert-butanol', 'CC(C)(C)O', 'alcohol'],
    ['geraniol', 'CC(C)=CCC/C(C)=C/CO', 'alcohol'],
    ['acetic acid', 'CC(=O)O', 'acid'],
    ['acetic acid, other order', 'CC(O)=O', 'acid'],
    ['formic acid', 'C(=O)O', 'acid'],
    ['phenol, Kekule', 'C1=CC=C(C=C1)O', 'other'],
    ['phenol, aromatic', 'Oc1ccccc1', 'other'],
    ['formamide', 'C(=O)N', 'other'],
    ['N-methylacetamide', 'CNC(C)=O', 'other'],
    ['ethyl acetate', 'CCOC(=O)C', null],
    ['acetic anhydride', 'CC(=O)OC(=O)C', null],
    ['N,N-dimethylformamide', 'CN(C)C=O', null],
    ['N-methyl-2-pyrrolidone', 'CN1CCCC1=O', null],
    ['nitrobenzene', 'C1=CC=C(C=C1)[N+](=O)[O-]', null],
    ['dimethyl sulfoxide', 'CS(=O)C', null],
    ['cyclohexanone', 'C1CCC(=O)CC1', null],
    ['aniline', 'C1=CC=C(C=C1)N', null],
    ['diethyl ether', 'CCOCC', null],
    ['methyl salicylate, bonded within itself', 'COC(=O)C1=CC=CC=C1O', null],
    ['salicylaldehyde, bonded within itself', 'C1=CC=C(C(=C1)C=O)O', null],
    ['chloroform', 'C(Cl)(Cl)Cl', null],
  ])('%s', (_name, smiles, expected) => {
    expect(associationClassOfSmiles(smiles)).toBe(expected);
  });

  it('counts hydrogens in brackets and reads stereo marks and two-digit rings', () => {
    expect(associationFeaturesOf('CC(=O)[NH]C')?.amideWithNH).toBe(true);
    expect(readSmiles('C[C@H](O)F')).toHaveLength(4);
    expect(readSmiles('C%12CC%12')?.every((atom) => atom.bonds.length === 2)).toBe(true);
  });
});
