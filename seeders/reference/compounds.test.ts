import { describe, expect, it } from 'vitest';
import { casCheckDigit, isCasNumber } from '@/lib/compounds/cas-number';
import { molarMassGMol, normaliseFormula, parseFormula } from '@/lib/compounds/formula';
import { drawStructureSvg, formulaAndMass, structureFeatures } from '@/lib/compounds/structure';
import { parseReferenceCompounds, readReferenceCompounds } from './read-reference';

const compounds = await readReferenceCompounds();

/**
 * Formulas of the rows whose SMILES is written from memory, each from its CAS Common Chemistry or CRC entry
 * (from memory) and not from the SMILES.
 */
const KNOWN_FORMULAS: Record<string, string> = {
  '110-54-3': 'C6H14',
  '142-82-5': 'C7H16',
  '111-65-9': 'C8H18',
  '111-84-2': 'C9H20',
  '124-18-5': 'C10H22',
  '1120-21-4': 'C11H24',
  '112-40-3': 'C12H26',
  '629-50-5': 'C13H28',
  '629-59-4': 'C14H30',
  '109-66-0': 'C5H12',
  '78-78-4': 'C5H12',
  '107-83-5': 'C6H14',
  '91-17-8': 'C10H18',
  '98-82-8': 'C9H12',
  '99-87-6': 'C10H14',
  '5989-27-5': 'C10H16',
  '123-35-3': 'C10H16',
  '78-70-6': 'C10H18O',
  '470-82-6': 'C10H18O',
  '106-22-9': 'C10H20O',
  '5392-40-5': 'C10H16O',
  '106-24-1': 'C10H18O',
  '99-49-0': 'C10H14O',
  '89-78-1': 'C10H20O',
  '5614-37-9': 'C6H12O',
  '122-00-9': 'C9H10O',
  '93-55-0': 'C9H10O',
  '123-11-5': 'C8H8O2',
  '104-55-2': 'C9H8O',
  '616-38-6': 'C3H6O3',
  '7087-68-5': 'C8H19N',
  '7732-18-5': 'H2O',
};

describe('the reference compounds', () => {
  it('are 207, each once', () => {
    expect(compounds).toHaveLength(207);
    expect(new Set(compounds.map(({ cas }) => cas)).size).toBe(207);
    expect(new Set(compounds.map(({ name }) => name)).size).toBe(207);
  });

  it('have CAS numbers with a right check digit', () => {
    for (const { cas } of compounds) {
      expect(isCasNumber(cas), cas).toBe(true);
      const digits = cas.replaceAll('-', '');
      expect(casCheckDigit(digits.slice(0, -1)), cas).toBe(Number(digits.at(-1)));
    }
  });

  it('have structures whose formula and mass agree with the table', async () => {
    for (const { name, smiles, formula, molarMassGMol: listed } of compounds) {
      const computed = await formulaAndMass(smiles);
      expect(computed.formula, name).toBe(formula);
      expect(Math.abs(computed.molarMassGMol - listed), name).toBeLessThan(0.01);
    }
  });

  it('have masses that follow from the formula and the standard atomic weights', () => {
    for (const { name, formula, molarMassGMol: listed } of compounds) {
      expect(normaliseFormula(formula), name).toBe(formula);
      const summed = molarMassGMol(parseFormula(formula) ?? {});
      expect(Math.abs(summed - listed) / listed, name).toBeLessThan(2e-4);
    }
  });

  it('agree with the published formula where the SMILES is from memory', () => {
    const fromMemory = compounds.filter(({ smilesSource }) => smilesSource === 'from memory');
    expect(fromMemory.map(({ cas }) => cas).sort()).toEqual(Object.keys(KNOWN_FORMULAS).sort());
    for (const { cas, formula } of fromMemory) expect(formula, cas).toBe(KNOWN_FORMULAS[cas]);
  });

  it('have InChIKeys of the right form, or none, and none twice', () => {
    const keys = compounds.flatMap(({ inchikey }) => (inchikey === null ? [] : [inchikey]));
    for (const key of keys) expect(key).toMatch(/^[A-Z]{14}-[A-Z]{8}SA-[A-Z]$/);
    expect(new Set(keys).size).toBe(keys.length);
    expect(keys.length).toBeGreaterThanOrEqual(175);
  });

  it('have synonyms that name one compound only', () => {
    const owner = new Map<string, string>();
    for (const { cas, name, synonyms } of compounds)
      for (const word of [name, ...synonyms]) {
        const known = owner.get(word.toLowerCase());
        expect(known, `${word} is a name of ${known} and ${cas}`).toBeUndefined();
        owner.set(word.toLowerCase(), cas);
      }
  });

  it('can all be drawn and searched for groups', async () => {
    for (const { name, smiles } of compounds) {
      expect(await drawStructureSvg(smiles, { width: 200, height: 140, title: name }), name).toMatch(
        /<line|<text/,
      );
      expect((await structureFeatures(smiles)).water, name).toBe(name === 'water');
    }
  });

  it('call the usual ethers peroxide formers', () => {
    const classOf = (cas: string) => compounds.find((compound) => compound.cas === cas)?.peroxideClass;
    // Kelly 1996; Prudent Practices 2011 (from memory): diisopropyl ether A; diethyl ether, THF, dioxane B; styrene C.
    expect(classOf('108-20-3')).toBe('A');
    for (const cas of ['60-29-7', '109-99-9', '123-91-1']) expect(classOf(cas), cas).toBe('B');
    expect(classOf('100-42-5')).toBe('C');
    expect(classOf('110-54-3')).toBeNull();
  });
});

describe('reading the table of compounds', () => {
  const header =
    'name\tcas\tformula\tmolarMassGMol\tsmiles\tinchikey\tsmilesSource\tperoxideClass\tsynonyms\n';

  it('names the line that cannot be read', () => {
    expect(() => parseReferenceCompounds(`${header}water\t7732-18-5\tH2O\theavy\tO\t\tx\t\t\n`)).toThrow(
      /Line 2.*heavy/,
    );
    expect(() => parseReferenceCompounds(`${header}water\t7732-18-5\n`)).toThrow(/Line 2 has 2 cells/);
    expect(() => parseReferenceCompounds(`${header}ether\t60-29-7\tC4H10O\t74.1\tCCOCC\t\tx\tD\t\n`)).toThrow(
      /peroxide/,
    );
  });

  it('says which column is missing', () => {
    expect(() => parseReferenceCompounds('name\tcas\n')).toThrow(/no column formula/);
  });
});
