import type { Transaction } from 'sequelize';
import { type Recorder, recorded } from '@/lib/audit/recorded';
import { rejudgeOpenFractions } from '@/lib/acceptance/rejudge-open-fractions';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { requirePerson } from '@/lib/auth/require-person';
import { newId } from '@/lib/database/ids';
import { LiteratureValue } from '@/lib/database/records';
import { invalidField, Problem } from '@/lib/errors';
import { literatureValueProblems } from './literature-value-problems';
import { movePreference } from './prefer-literature-value';
import { preferenceJump } from './preference-jump';
import { presentLiteratureValue } from './present';
import { propertyDefinition } from './property-names';
import { requireCompound, requireCompoundForChange, requireLiteratureValue } from './require-compound';
import type { LiteratureValueJson, NewLiteratureValue } from './schema';

function checkDraft(draft: NewLiteratureValue): void {
  const { unit } = propertyDefinition(draft.property);
  if (draft.unit !== undefined && draft.unit !== unit)
    throw invalidField(
      'unit',
      `The ${draft.property} is kept in ${unit}. Convert the value, then send it without a unit.`,
    );
  const problems = literatureValueProblems(draft);
  if (problems.length === 0) return;
  const path = propertyDefinition(draft.property).coefficients ? 'coefficients' : 'value';
  throw new Problem('invalid', problems.join(' '), {
    errors: problems.map((message) => ({ path, message })),
  });
}

/** The value that is to be replaced: of the same property, and not replaced by another correction before. */
async function requireReplaceable(compoundId: string, draft: NewLiteratureValue, transaction: Transaction) {
  if (draft.corrects === undefined) return null;
  const old = await requireLiteratureValue(compoundId, draft.corrects, transaction);
  if (old.property !== draft.property)
    throw invalidField('corrects', `That value is a ${old.property}: a correction is of the same property.`);
  if (old.replacedAt !== null)
    throw new Problem('state-conflict', 'This value has been corrected already. Correct the newer one.');
  return old;
}

function rowOf(compoundId: string, draft: NewLiteratureValue, addedById: string) {
  const { property, source } = draft;
  return {
    id: newId(),
    compoundId,
    ...{ property, source, addedById },
    unit: propertyDefinition(property).unit,
    value: draft.value ?? null,
    coefficients: draft.coefficients ?? null,
    temperatureC: draft.temperatureC ?? null,
    pressureKPa: draft.pressureKPa ?? null,
    wavelengthNm: draft.wavelengthNm ?? null,
    rangeMinC: draft.rangeMinC ?? null,
    rangeMaxC: draft.rangeMaxC ?? null,
    uncertainty: draft.uncertainty ?? null,
    note: draft.note ?? null,
    reason: draft.reason ?? null,
    replacesId: draft.corrects ?? null,
  };
}

async function replace(old: LiteratureValue, { transaction }: Recorder): Promise<boolean> {
  const wasPreferred = old.preferred;
  await old.update({ replacedAt: new Date(), preferred: false }, { transaction });
  return wasPreferred;
}

/**
 * Adds a literature value with its conditions and source. With `corrects` it replaces that value, which stays,
 * marked as replaced. The first value of a property, the correction of the preferred one, and one sent with
 * `preferred` become the preferred value.
 * @throws Problem 403, 404, 409 where the value was corrected before, 422 where conditions or number do not hold,
 * or a preferred value far from the one before comes without a reason.
 */
export async function addLiteratureValue(
  actor: Actor,
  compoundId: string,
  draft: NewLiteratureValue,
): Promise<LiteratureValueJson> {
  await requireCompound(compoundId);
  authorise(actor, 'compound.write', null);
  const person = requirePerson(actor);
  checkDraft(draft);
  const made = await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    await requireCompoundForChange(compoundId, transaction);
    const old = await requireReplaceable(compoundId, draft, transaction);
    const takesOver = old ? await replace(old, recorder) : false;
    const kept = { compoundId, property: draft.property, preferred: true, replacedAt: null };
    const current = await LiteratureValue.findOne({ where: kept, transaction });
    const row = rowOf(compoundId, draft, person.userId);
    const preferred = takesOver || draft.preferred === true || current === null;
    if (preferred && current) {
      const jump = draft.reason === undefined ? preferenceJump(draft.property, current, draft) : null;
      if (jump) throw invalidField('reason', jump);
      await movePreference(current, recorder);
    }
    const value = await LiteratureValue.create({ ...row, preferred }, { transaction });
    record({
      type: old ? 'literature.corrected' : 'literature.added',
      recordType: 'compound',
      recordId: compoundId,
      before: old && { id: old.id, value: old.value, coefficients: old.coefficients, source: old.source },
      after: { ...row, preferred },
      reason: draft.reason,
    });
    return value;
  });
  // What waits to be submitted is judged by the new value; what was submitted or signed keeps its verdict.
  await rejudgeOpenFractions(actor, { compoundId, asImpurity: true });
  return presentLiteratureValue(made, person.name);
}
