import type { Transaction } from 'sequelize';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Compound, Fraction, type Run, RunImpurity } from '@/lib/database/records';
import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { invalidField } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';
import { changedFields } from './changed-fields';
import { requireRunForChange } from './require-run';
import { resolveImpurities } from './resolve-compounds';
import { requireRunTimes } from './run-times';
import type { RunChange } from './schema';

/**
 * Changes a run of the caller's groups. 404, 403, 409 for another version, 422. Known impurities
 * are part of what fractions are judged by: their verdicts are computed anew and their signatures end,
 * so a reason is required where one is signed off.
 */
export async function changeRun(actor: Actor, code: string, body: RunChange, version: number): Promise<void> {
  await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const run = await requireRunForChange(actor, code, transaction);
    authorise(actor, 'run.write', run.groupId);
    requireSameVersion(run, version);
    const { knownImpurities, startedAt, endedAt, reason, ...rest } = body;
    const wanted = {
      ...rest,
      startedAt: startedAt === undefined ? undefined : new Date(startedAt),
      endedAt: endedAt == null ? endedAt : new Date(endedAt),
    };
    const end = wanted.endedAt === undefined ? run.endedAt : wanted.endedAt;
    requireRunTimes(wanted.startedAt ?? run.startedAt, end);
    const { before, after } = changedFields(run.get(), wanted);
    const impurities = knownImpurities && (await changeImpurities(run, knownImpurities, transaction));
    if (Object.keys(after).length === 0 && !impurities) return;
    const touched = impurities ? await fractionsOf(run, transaction) : [];
    if (!reason && touched.some((fraction) => fraction.status === 'signed off')) {
      throw invalidField(
        'reason',
        'A fraction of this run is signed off, and this change ends its signature. Say why.',
      );
    }
    // The version goes up also when only the impurities changed: they belong to the run.
    run.set(after).changed('updatedAt', true);
    await run.save({ transaction });
    record({
      type: 'run.changed',
      recordType: 'run',
      recordId: run.id,
      groupId: run.groupId,
      before: { ...before, ...impurities?.before },
      after: { ...after, ...impurities?.after },
      reason: reason ?? null,
    });
    const what = 'known impurities of the run changed';
    for (const fraction of touched) {
      await fractionChanged(recorder, fraction, reason ? `${what}: ${reason}` : what);
    }
  });
}

/** The fractions of a run, locked in the order of their numbers. */
async function fractionsOf(run: Run, transaction: Transaction): Promise<Fraction[]> {
  return Fraction.findAll({
    where: { runId: run.id },
    order: [['number', 'ASC']],
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
}

/** Writes the new set of known impurities; undefined when it is the old one. */
async function changeImpurities(run: Run, references: string[], transaction: Transaction) {
  const target = await Compound.findByPk(run.targetCompoundId, { transaction, rejectOnEmpty: true });
  const wanted = await resolveImpurities(references, target, transaction);
  const rows = await RunImpurity.findAll({ where: { runId: run.id }, transaction });
  const old = rows.map((row) => row.compoundId).sort();
  const ids = wanted.map((compound) => compound.id).sort();
  if (old.join() === ids.join()) return undefined;
  await RunImpurity.destroy({ where: { runId: run.id }, transaction });
  await RunImpurity.bulkCreate(
    ids.map((compoundId) => ({ id: newId(), runId: run.id, compoundId })),
    { transaction },
  );
  return { before: { knownImpurities: old }, after: { knownImpurities: ids } };
}
