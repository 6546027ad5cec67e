import { type Recorder, recorded } from '@/lib/audit/recorded';
import { rejudgeOpenFractions } from '@/lib/acceptance/rejudge-open-fractions';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { LiteratureValue, User } from '@/lib/database/records';
import { Problem } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';
import { presentLiteratureValue } from './present';
import { requireCompound, requireCompoundForChange, requireLiteratureValue } from './require-compound';
import type { LiteratureValueJson } from './schema';

/** Takes the preference from a value, so that another can have it. */
export async function movePreference(from: LiteratureValue, { transaction }: Recorder): Promise<void> {
  await from.update({ preferred: false }, { transaction });
}

/** Makes a value in force the preferred one of its property. @throws Problem 403, 404, 409. */
export async function preferLiteratureValue(
  actor: Actor,
  { id, valueId }: { id: string; valueId: string },
  version: number,
  reason: string,
): Promise<LiteratureValueJson> {
  await requireCompound(id);
  authorise(actor, 'compound.write', null);
  const row = await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    await requireCompoundForChange(id, transaction);
    const value = await requireLiteratureValue(id, valueId, transaction);
    requireSameVersion(value, version);
    if (value.replacedAt !== null)
      throw new Problem('state-conflict', 'A corrected value cannot be preferred. Prefer the newer one.');
    const where = { compoundId: id, property: value.property, preferred: true, replacedAt: null };
    const current = await LiteratureValue.findOne({ where, transaction });
    if (current?.id === valueId) return value;
    if (current) await movePreference(current, recorder);
    await value.update({ preferred: true }, { transaction });
    record({
      type: 'literature.preferred',
      recordType: 'compound',
      recordId: id,
      before: current && { id: current.id, value: current.value, source: current.source },
      after: { id: value.id, property: value.property, value: value.value, source: value.source },
      reason,
    });
    return value;
  });
  // What waits to be submitted is judged by the new value; what was submitted or signed keeps its verdict.
  await rejudgeOpenFractions(actor, { compoundId: id, asImpurity: true });
  const author = row.addedById ? await User.findByPk(row.addedById) : null;
  return presentLiteratureValue(row, author?.name ?? null);
}
