import { QueryTypes } from 'sequelize';
import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { database } from '@/lib/database/connection';
import { newId } from '@/lib/database/ids';
import { Fraction } from '@/lib/database/records';
import { requireMasses } from './fraction-masses';
import type { NewFraction } from './fraction-schema';
import { requirePerson } from '@/lib/auth/require-person';
import { requireRunForChange } from './require-run';
import { requirePlausibleTime } from './run-times';

/**
 * Starts a fraction of a run and returns its code, `D-2026-0042-F3`. The run's row is locked while the
 * number is taken, so that numbers have no gaps. Throws 404, 403 or 422.
 */
export async function createFraction(
  actor: Actor,
  runCode: string,
  body: NewFraction,
): Promise<{ code: string }> {
  const collectedAt = body.collectedAt ? new Date(body.collectedAt) : new Date();
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const run = await requireRunForChange(actor, runCode, transaction);
    authorise(actor, 'fraction.write', run.groupId);
    requirePlausibleTime('collectedAt', collectedAt);
    requireMasses(body);
    const number = run.nextFractionNumber;
    const facts = { ...body, number, collectedAt };
    const code = `${run.code}-F${number}`;
    const fraction = await Fraction.create(
      {
        ...facts,
        id: newId(),
        code,
        runId: run.id,
        groupId: run.groupId,
        compoundId: run.targetCompoundId,
        collectedById: requirePerson(actor).userId,
      },
      { transaction },
    );
    // Not through the model: starting a fraction is no change of the run's own facts or version.
    await database().query('UPDATE runs SET nextFractionNumber = ? WHERE id = ?', {
      replacements: [number + 1, run.id],
      type: QueryTypes.UPDATE,
      transaction,
    });
    record({
      type: 'fraction.created',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: run.groupId,
      after: { code, run: run.code, ...facts },
    });
    // The database computes the net mass.
    await fraction.reload({ transaction });
    await fractionChanged(recorder, fraction, 'fraction started');
    return { code };
  });
}
