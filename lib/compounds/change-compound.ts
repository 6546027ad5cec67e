import { rejudgeOpenFractions } from '@/lib/acceptance/rejudge-open-fractions';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { type Compound, CompoundSynonym } from '@/lib/database/records';
import { requireSameVersion } from '@/lib/http/version';
import { checkIdentity } from './check-identity';
import { describeCompound } from './read-compound';
import { requireCompound, requireCompoundForChange } from './require-compound';
import type { CompoundChange, CompoundJson } from './schema';
import { requireUnusedIdentity, writeSynonyms } from './write-synonyms';

/** The identity after the change. A new structure or formula brings its own formula and mass unless they are typed too. */
function identityAfter(compound: Compound, change: CompoundChange) {
  const newStructure = change.smiles !== undefined;
  const newFormula = newStructure || change.formula !== undefined;
  return {
    cas: change.cas === undefined ? compound.casNumber : change.cas,
    smiles: newStructure ? change.smiles : compound.smiles,
    formula:
      change.formula !== undefined ? change.formula : newStructure && change.smiles ? null : compound.formula,
    molarMassGMol:
      change.molarMassGMol !== undefined ? change.molarMassGMol : newFormula ? null : compound.molarMassGMol,
  };
}

function factsOf({ name, casNumber, formula, molarMassGMol, smiles, inchiKey, peroxideClass }: Compound) {
  return { name, casNumber, formula, molarMassGMol, smiles, inchiKey, peroxideClass };
}

/** Changes a compound. @throws Problem 403, 404, 409 (version, or its name or number is taken), 422 (contradiction). */
export async function changeCompound(
  actor: Actor,
  id: string,
  version: number,
  change: CompoundChange,
): Promise<CompoundJson> {
  await requireCompound(id);
  authorise(actor, 'compound.write', null);
  let newIdentity = false;
  const compound = await recorded(actor, async ({ transaction, record }) => {
    const row = await requireCompoundForChange(id, transaction);
    requireSameVersion(row, version);
    const identity = await checkIdentity(identityAfter(row, change));
    await requireUnusedIdentity({ name: change.name, casNumber: identity.casNumber }, id, transaction);
    const synonymsBefore = await CompoundSynonym.findAll({ where: { compoundId: id }, transaction });
    const before = { ...factsOf(row), synonyms: synonymsBefore.map(({ name }) => name) };
    row.set(identity);
    newIdentity = row.changed('smiles') === true || row.changed('casNumber') === true;
    if (change.name !== undefined) row.name = change.name;
    if (change.inchiKey !== undefined) row.inchiKey = change.inchiKey;
    if (change.peroxideClass !== undefined) row.peroxideClass = change.peroxideClass;
    // Synonyms are rows of their own, but they belong to the record that was read: its version counts for them too.
    row.changed('updatedAt', true);
    await row.save({ transaction });
    const synonyms = change.synonyms
      ? await writeSynonyms(row, change.synonyms, transaction)
      : before.synonyms;
    record({
      type: 'compound.changed',
      recordType: 'compound',
      recordId: id,
      before,
      after: { ...factsOf(row), synonyms },
    });
    return row;
  });
  // What a detector, a lamp or a reagent can see of it is told by its structure and its CAS number.
  if (newIdentity) await rejudgeOpenFractions(actor, { compoundId: id, asImpurity: true });
  return describeCompound(compound);
}
