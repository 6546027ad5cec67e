import { Op } from 'sequelize';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { Fraction, RunImpurity } from '@/lib/database/records';
import { judgeFraction } from './judge-fraction';

const beforeSubmission = ['open', 'returned', 'reopened'];

/**
 * Judges the fractions that a compound matters for and that are not submitted yet, each in a transaction of its own,
 * so that a new limit, literature value or structure shows at once: those collected as the compound, and with
 * `asImpurity` also those of runs where it is a known impurity. Submitted and signed ones keep what they were judged by.
 */
export async function rejudgeOpenFractions(
  actor: Actor,
  { groupId, compoundId, asImpurity = false }: { groupId?: string; compoundId: string; asImpurity?: boolean },
): Promise<void> {
  const runs = asImpurity ? await RunImpurity.findAll({ where: { compoundId }, attributes: ['runId'] }) : [];
  const where = {
    [Op.or]: [{ compoundId }, { runId: runs.map((run) => run.runId) }],
    status: beforeSubmission,
    ...(groupId ? { groupId } : {}),
  };
  const rows = await Fraction.findAll({ where, attributes: ['id'], order: [['id', 'ASC']] });
  for (const { id } of rows) {
    await recorded(actor, async (recorder) => {
      const { transaction } = recorder;
      const fraction = await Fraction.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
      if (fraction && beforeSubmission.includes(fraction.status)) await judgeFraction(recorder, fraction);
    });
  }
}
