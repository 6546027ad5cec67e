import { describe, expect, it } from 'vitest';
import type { StructureFeatures } from './structure-features';
import { drawStructureSvg, formulaAndMass, StructureError, structureFeatures } from './structure';

/** Groups as a practitioner names them; a group not listed must be absent. */
const KNOWN: [name: string, smiles: string, groups: (keyof StructureFeatures)[]][] = [
  ['hexane', 'CCCCCC', []],
  ['cyclohexane', 'C1CCCCC1', []],
  ['toluene', 'CC1=CC=CC=C1', ['aromatic']],
  ['limonene', 'CC1=CC[C@H](C(C)=C)CC1', ['alkene']],
  ['myrcene', 'CC(C)=CCCC(=C)C=C', ['alkene', 'conjugated']],
  ['styrene', 'C=CC1=CC=CC=C1', ['aromatic', 'alkene', 'conjugated']],
  ['linalool', 'CC(C)=CCCC(C)(O)C=C', ['alkene', 'alcohol', 'associates']],
  ['citral', 'CC(C)=CCCC(C)=CC=O', ['alkene', 'aldehyde', 'conjugated', 'conjugatedCarbonyl']],
  ['cyclohexanone', 'C1CCC(=O)CC1', ['ketone']],
  ['cyclohexanol', 'C1CCC(CC1)O', ['alcohol', 'associates']],
  ['isophorone', 'CC1=CC(=O)CC(C1)(C)C', ['alkene', 'ketone', 'conjugated', 'conjugatedCarbonyl']],
  ['benzaldehyde', 'C1=CC=C(C=C1)C=O', ['aromatic', 'aldehyde', 'conjugated', 'conjugatedCarbonyl']],
  ['benzyl alcohol', 'C1=CC=C(C=C1)CO', ['aromatic', 'alcohol', 'associates']],
  ['phenol', 'C1=CC=C(C=C1)O', ['aromatic', 'phenol', 'associates']],
  ['ethyl acetate', 'CCOC(=O)C', ['ester']],
  ['acetic acid', 'CC(=O)O', ['acid', 'associates']],
  ['acetic anhydride', 'CC(=O)OC(=O)C', ['anhydride']],
  ['ethyl acrylate', 'CCOC(=O)C=C', ['ester', 'alkene', 'conjugated']],
  ['propylene carbonate', 'CC1COC(=O)O1', ['ester']],
  ['tetrahydrofuran', 'C1CCOC1', ['ether']],
  ['anisole', 'COC1=CC=CC=C1', ['aromatic', 'ether']],
  ['diphenyl ether', 'C1=CC=C(C=C1)OC2=CC=CC=C2', ['aromatic', 'ether']],
  ['ethyl vinyl ether', 'CCOC=C', ['alkene', 'ether']],
  ['furan', 'C1=COC=C1', ['aromatic']],
  ['acetonitrile', 'CC#N', ['nitrile']],
  ['benzonitrile', 'C1=CC=C(C=C1)C#N', ['aromatic', 'nitrile', 'conjugated']],
  ['1-hexyne', 'CCCCC#C', ['alkyne']],
  ['butane-1-thiol', 'CCCCS', ['thiol']],
  ['chloroform', 'C(Cl)(Cl)Cl', ['halide']],
  ['nitromethane', 'C[N+](=O)[O-]', ['nitro']],
  ['nitrobenzene', 'C1=CC=C(C=C1)[N+](=O)[O-]', ['aromatic', 'nitro', 'conjugated']],
  ['butylamine', 'CCCCN', ['primaryAmine', 'amine', 'associates']],
  ['diethylamine', 'CCNCC', ['amine', 'associates']],
  ['triethylamine', 'CCN(CC)CC', ['amine']],
  ['aniline', 'C1=CC=C(C=C1)N', ['aromatic', 'primaryAmine', 'amine', 'associates']],
  ['pyridine', 'C1=CC=NC=C1', ['aromatic']],
  ['pyrrole', 'C1=CNC=C1', ['aromatic', 'associates']],
  ['N,N-dimethylformamide', 'CN(C)C=O', ['amide']],
  ['formamide', 'C(=O)N', ['amide', 'associates']],
  ['water', 'O', ['water', 'associates']],
  ['carbon disulfide', 'C(=S)=S', []],
  ['eugenol', 'COC1=C(C=CC(=C1)CC=C)O', ['aromatic', 'alkene', 'ether', 'phenol', 'associates']],
];

describe('groups in a structure', () => {
  it.each(KNOWN)('names the groups of %s', async (_name, smiles, groups) => {
    const found = await structureFeatures(smiles);
    const present = Object.entries(found).flatMap(([group, held]) => (held ? [group] : []));
    expect(present.sort()).toEqual([...groups].sort());
  });
});

describe('formula and molar mass', () => {
  it('computes them from the structure', async () => {
    // CAS Common Chemistry: eugenol C10H12O2, 164.20 g/mol (from memory).
    const { formula, molarMassGMol } = await formulaAndMass('COC1=C(C=CC(=C1)CC=C)O');
    expect(formula).toBe('C10H12O2');
    expect(molarMassGMol).toBeCloseTo(164.2, 1);
    expect((await formulaAndMass('C[Si](C)(C)Cl')).formula).toBe('C3H9ClSi');
  });

  it.each([
    '',
    '  ',
    'C1CC',
    'not a structure',
    'CC(',
    'CC)',
    'C[OH',
    'C'.repeat(600),
    '<script>',
    'C'.repeat(300),
  ])('refuses %s and says what to do', async (smiles) => {
    await expect(formulaAndMass(smiles)).rejects.toThrow(StructureError);
  });
});

describe('structure drawings', () => {
  const DRAWN = [...KNOWN.slice(2, 12), ...KNOWN.slice(-10)];

  it.each(DRAWN)('draws %s with plain shapes in the colour of the text', async (name, smiles) => {
    const svg = await drawStructureSvg(smiles, { width: 240, height: 160, title: name });
    expect(svg).toMatch(/^<svg xmlns="http:\/\/www.w3.org\/2000\/svg" width="240" height="160"/);
    expect(svg).toContain(`<title>${name}</title>`);
    const tags = new Set([...svg.matchAll(/<\/?([A-Za-z]+)/g)].map((match) => match[1]));
    for (const tag of tags) expect(['svg', 'title', 'line', 'polygon', 'text', 'circle']).toContain(tag);
    expect(svg).not.toMatch(/script|foreignObject|style|href|url\(|rgb\(|#|\son\w+=|\sid=|class=/i);
    expect(svg).toMatch(/<line|<text/);
  });

  it('draws a wedge for a stereocentre but no words about it', async () => {
    const svg = await drawStructureSvg('CC1=CC[C@H](C(C)=C)CC1', { width: 240, height: 160 });
    expect(svg).toContain('<polygon');
    expect(svg).not.toContain('enantiomer');
    expect(svg).toContain('<title>Structure of C10H16</title>');
  });

  it('escapes a title so that no markup can slip in', async () => {
    const svg = await drawStructureSvg('CCO', {
      width: 100,
      height: 100,
      title: '"><script>alert(1)</script>',
    });
    expect(svg).not.toContain('<script');
    expect(svg).toContain('&lt;script&gt;');
  });

  it('keeps every shape inside its frame', async () => {
    const svg = await drawStructureSvg('CCCCCCCCCCCCCCCC', { width: 200, height: 80 });
    for (const [, x] of svg.matchAll(/x[12]="([\d.-]+)"/g)) {
      expect(Number(x)).toBeGreaterThanOrEqual(0);
      expect(Number(x)).toBeLessThanOrEqual(200);
    }
  });

  it('refuses a size that no page has', async () => {
    await expect(drawStructureSvg('CCO', { width: 1e6, height: 100 })).rejects.toThrow(StructureError);
    await expect(drawStructureSvg('CCO', { width: Number.NaN, height: 100 })).rejects.toThrow(StructureError);
  });
});
