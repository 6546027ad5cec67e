import { describe, expect, it } from 'vitest';
import { buildCoverage } from './coverage';
import { molePercentThatMoves } from './coverage/boiling-cell';
import {
  bare,
  benzaldehyde,
  decane,
  ethanol,
  ethylAcetate,
  facts,
  formicAcid,
  gcTrace,
  heptane,
  limonene,
  linalool,
  pCymene,
  photoUnder,
  readAs,
  toluene,
} from './compound-facts.fixture';
import type { CoverageCell, JudgeInputs } from './judge-inputs';

function cell(inputs: JudgeInputs, compound: string, test: string): CoverageCell {
  const found = buildCoverage(inputs)
    .find((row) => row.compound === compound)
    ?.tests.find((one) => one.test === test);
  if (!found) throw new Error(`no cell for ${compound} and ${test}`);
  return found;
}

const at1atm = { fromC: 77, toC: 77.3, pressureMbar: 1013.25 };

// Rules of the trade (common practice) unless a source stands beside the check.
describe('what a plate shows', () => {
  it('UV 254 nm shows p-cymene in limonene, since it is aromatic', () => {
    const inputs = { ...bare(limonene, pCymene), lanes: [photoUnder('uv-254')] };
    expect(cell(inputs, 'p-cymene', 'TLC, UV 254 nm').state).toBe('sees');
  });
  it('UV 254 nm is blind to decane, which has no chromophore', () => {
    const inputs = { ...bare(limonene, decane), lanes: [photoUnder('uv-254')] };
    expect(cell(inputs, 'decane', 'TLC, UV 254 nm')).toMatchObject({ state: 'blind' });
  });
  it('permanganate shows linalool, an unsaturated alcohol', () => {
    const inputs = { ...bare(limonene, linalool), lanes: [photoUnder('permanganate')] };
    expect(cell(inputs, 'linalool', 'TLC, potassium permanganate').state).toBe('sees');
  });
  it('no visualiser shows toluene, which has left the plate (under 150 °C)', () => {
    const inputs = { ...bare(limonene, toluene), lanes: [photoUnder('uv-254')] };
    const found = cell(inputs, 'toluene', 'TLC, UV 254 nm');
    expect(found.state).toBe('blind');
    expect(found.reason).toContain('leave the plate');
  });
  it('a compound without a boiling point may have evaporated: blind, and the missing value is named', () => {
    const unknown = facts('odd liquid', '1-1-1', null, 1.5, { chromophore254: true });
    const inputs = { ...bare(limonene, unknown), lanes: [photoUnder('uv-254')] };
    expect(cell(inputs, 'odd liquid', 'TLC, UV 254 nm').reason).toContain('No literature value');
  });
  it('a compound whose reference runs with the target is not seen (Ph. Eur. 2.2.27: compare on one plate)', () => {
    const lane = photoUnder('uv-254');
    const together = [{ compoundId: pCymene.id, spots: [{ rf: 0.51, rfUncertainty: 0.012, flags: [] }] }];
    const apart = [{ compoundId: pCymene.id, spots: [{ rf: 0.7, rfUncertainty: 0.012, flags: [] }] }];
    const plate = (references: typeof together) => ({
      ...bare(limonene, pCymene),
      lanes: [{ ...lane, references }],
    });
    expect(cell(plate(together), 'p-cymene', 'TLC, UV 254 nm').state).toBe('blind');
    expect(cell(plate(apart), 'p-cymene', 'TLC, UV 254 nm').state).toBe('sees');
  });
});

describe('what a gas chromatogram shows', () => {
  it('a flame ionisation detector is blind to water and to formic acid', () => {
    const inputs = { ...bare(ethylAcetate, formicAcid), traces: [gcTrace(ethylAcetate)] };
    expect(cell(inputs, 'water', 'GC, FID').state).toBe('blind');
    expect(cell(inputs, 'formic acid', 'GC, FID').state).toBe('blind');
  });
  it('a thermal conductivity detector sees water', () => {
    const inputs = { ...bare(ethylAcetate), traces: [gcTrace(ethylAcetate, {}, 'TCD')] };
    expect(cell(inputs, 'water', 'GC, TCD').state).toBe('sees');
  });
  it('sees ethanol down to what stands three times over the noise (Ph. Eur. 2.2.46)', () => {
    const inputs = { ...bare(ethylAcetate, ethanol), traces: [gcTrace(ethylAcetate)] };
    // 99.8 area % at S/N 10,000: S/N 3 is 99.8 * 3 / 10,000.
    expect(cell(inputs, 'ethanol', 'GC, FID')).toMatchObject({ state: 'sees', limitPercent: 99.8 * 3e-4 });
  });
  it('a compound known to leave the column with the target is not seen', () => {
    const crude = gcTrace(ethylAcetate, { retentionTimeMin: 5.03, compoundId: ethanol.id });
    const inputs = {
      ...bare(ethylAcetate, ethanol),
      traces: [gcTrace(ethylAcetate), { ...crude, subject: 'crude' as const }],
    };
    expect(cell(inputs, 'ethanol', 'GC, FID')).toMatchObject({ state: 'blind' });
  });
  it('a compound in an excluded range is not seen', () => {
    const crude = gcTrace(ethylAcetate, { retentionTimeMin: 2, compoundId: ethanol.id });
    const own = { ...gcTrace(ethylAcetate), excluded: [{ fromMin: 1.5, toMin: 2.5, reason: 'solvent' }] };
    const inputs = { ...bare(ethylAcetate, ethanol), traces: [own, { ...crude, subject: 'crude' as const }] };
    expect(cell(inputs, 'ethanol', 'GC, FID').reason).toContain('excluded range');
  });
  it('what an unlisted detector answers to is not claimed', () => {
    const inputs = { ...bare(ethylAcetate, ethanol), traces: [gcTrace(ethylAcetate, {}, 'NPD')] };
    expect(cell(inputs, 'ethanol', 'GC, NPD').state).toBe('blind');
  });
});

describe('what the refractive index shows', () => {
  it('sees an impurity of index 1.5335 in hexane, 1.3749, from 0.33 vol % on (Lorentz-Lorenz, tolerance 0.0005)', () => {
    const hexane = facts('hexane', '110-54-3', 68.7, 1.3749);
    const impurity = facts('of index 1.5335', '2-2-2', 190, 1.5335);
    const inputs = { ...bare(hexane, impurity), refractive: readAs(hexane) };
    expect(cell(inputs, 'of index 1.5335', 'refractive index').limitPercent).toBeCloseTo(0.33, 2);
  });
  it('sees water in ethyl acetate, though only from over 1 vol % on', () => {
    const inputs = { ...bare(ethylAcetate), refractive: readAs(ethylAcetate) };
    const found = cell(inputs, 'water', 'refractive index');
    expect(found.state).toBe('sees');
    expect(found.limitPercent).toBeGreaterThan(1);
  });
  it('is blind to a compound of the same index', () => {
    const twin = facts('twin', '3-3-3', 150, 1.3725);
    const inputs = { ...bare(ethylAcetate, twin), refractive: readAs(ethylAcetate) };
    expect(cell(inputs, 'twin', 'refractive index').state).toBe('blind');
  });
  it('is blind without a literature value, and names whose', () => {
    const unknown = facts('odd liquid', '1-1-1', 150, null);
    const inputs = { ...bare(ethylAcetate, unknown), refractive: readAs(ethylAcetate) };
    expect(cell(inputs, 'odd liquid', 'refractive index')).toMatchObject({
      state: 'blind',
      reason: 'No literature value for the refractive index of odd liquid.',
    });
  });
});

describe('what the boiling range shows', () => {
  it('is blind to ethanol in ethyl acetate: 1 °C apart', () => {
    const inputs = { ...bare(ethylAcetate, ethanol), head: at1atm };
    expect(cell(inputs, 'ethanol', 'boiling range').state).toBe('blind');
  });
  it('sees toluene in ethyl acetate, 33 °C above', () => {
    const inputs = { ...bare(ethylAcetate, toluene), head: at1atm };
    expect(cell(inputs, 'toluene', 'boiling range').state).toBe('sees');
  });
  it('is blind to limonene beside p-cymene: close boilers', () => {
    const inputs = { ...bare(pCymene, limonene), head: { fromC: 176, toC: 177, pressureMbar: 1013.25 } };
    expect(cell(inputs, 'limonene', 'boiling range').state).toBe('blind');
  });
  it('is not done without a pressure, and says whether it would help', () => {
    expect(cell(bare(heptane, toluene), 'toluene', 'boiling range')).toMatchObject({
      state: 'not done',
      wouldSee: true,
    });
  });
  it("needs the share that Raoult's law gives", () => {
    // Ideal, heptane 98.4 °C with toluene 110.6 °C: 1 °C needs something like a tenth of toluene (textbook diagram).
    const share = molePercentThatMoves(heptane, toluene, 1013.25, 1);
    expect(share).toBeGreaterThan(5);
    expect(share).toBeLessThan(15);
  });
});

describe('the matrix', () => {
  it('always has a row for water, which decides only where it is a known impurity', () => {
    expect(buildCoverage(bare(ethylAcetate)).map(({ compound, decides }) => [compound, decides])).toEqual([
      ['water', false],
    ]);
    const known = buildCoverage({ ...bare(ethylAcetate), knownImpurities: [bare(ethylAcetate).water] });
    expect(known.map(({ compound, decides }) => [compound, decides])).toEqual([['water', true]]);
  });
  it('names the test that would close a hole', () => {
    const inputs = { ...bare(benzaldehyde, decane), lanes: [photoUnder('uv-254')] };
    const row = buildCoverage(inputs).find((one) => one.compound === 'decane');
    expect(row?.seen).toBe(false);
    expect(row?.advice).toContain('GC, FID');
  });
});
