import { invalidField } from '@/lib/errors';
import { casNumberProblem, parseCasNumber } from './cas-number';
import { hillFormula, molarMassGMol, parseFormula } from './formula';
import { formulaAndMass, StructureError } from './structure';

export interface Identity {
  cas?: string | null;
  formula?: string | null;
  molarMassGMol?: number | null;
  smiles?: string | null;
}

export interface CheckedIdentity {
  casNumber: string | null;
  formula: string | null;
  molarMassGMol: number | null;
  smiles: string | null;
}

/**
 * Molar masses may differ by as much as tables of atomic weights and roundings do: 0.05 g/mol or 0.05 %,
 * whichever is more (common practice). The lightest mistake, one hydrogen, is 1 g/mol.
 */
const MASS_TOLERANCE_G_MOL = 0.05;
const MASS_TOLERANCE_RELATIVE = 0.0005;

async function fromStructure(smiles: string) {
  try {
    return await formulaAndMass(smiles);
  } catch (error) {
    if (error instanceof StructureError) throw invalidField('smiles', error.message);
    throw error;
  }
}

function fromFormula(text: string) {
  const counts = parseFormula(text);
  if (!counts)
    throw invalidField('formula', `"${text}" is no molecular formula. Write it as C4H8O2 or (CH3)2CO.`);
  return { formula: hillFormula(counts), molarMassGMol: Math.round(molarMassGMol(counts) * 1000) / 1000 };
}

/**
 * Checks what a compound is said to be against itself: the check digit of the CAS number, formula against structure,
 * molar mass against formula. What was not typed is computed from what was.
 * @throws Problem 422 that names the field and says what to compare.
 */
export async function checkIdentity(typed: Identity): Promise<CheckedIdentity> {
  const casProblem = typed.cas ? casNumberProblem(typed.cas) : null;
  if (casProblem) throw invalidField('cas', casProblem);
  const drawn = typed.smiles ? await fromStructure(typed.smiles) : null;
  const written = typed.formula ? fromFormula(typed.formula) : null;
  if (drawn && written && drawn.formula !== written.formula)
    throw invalidField(
      'formula',
      `The SMILES is ${drawn.formula}, but the formula typed is ${written.formula}. Correct the wrong one.`,
    );
  const computed = drawn ?? written;
  const mass = typed.molarMassGMol ?? null;
  if (computed && mass !== null) {
    const tolerance = Math.max(MASS_TOLERANCE_G_MOL, MASS_TOLERANCE_RELATIVE * computed.molarMassGMol);
    if (Math.abs(mass - computed.molarMassGMol) > tolerance)
      throw invalidField(
        'molarMassGMol',
        `${computed.formula} has ${computed.molarMassGMol} g/mol, but ${mass} g/mol was typed. Correct the wrong one.`,
      );
  }
  return {
    casNumber: typed.cas ? parseCasNumber(typed.cas) : null,
    formula: computed?.formula ?? null,
    molarMassGMol: computed?.molarMassGMol ?? mass,
    smiles: typed.smiles?.trim() ?? null,
  };
}
