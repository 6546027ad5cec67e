import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { Fraction } from '@/lib/database/records';
import { judgeFraction } from './judge-fraction';

const beforeSubmission = ['open', 'returned', 'reopened'];

/**
 * Judges the fractions of a compound that are not submitted yet, each in a transaction of its own, so that a
 * new limit or a new literature value shows at once. Submitted and signed ones keep what they were judged by.
 */
export async function rejudgeOpenFractions(
  actor: Actor,
  { groupId, compoundId }: { groupId?: string; compoundId: string },
): Promise<void> {
  const where = { compoundId, status: beforeSubmission, ...(groupId ? { groupId } : {}) };
  const rows = await Fraction.findAll({ where, attributes: ['id'], order: [['id', 'ASC']] });
  for (const { id } of rows) {
    await recorded(actor, async (recorder) => {
      const { transaction } = recorder;
      const fraction = await Fraction.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
      if (fraction && beforeSubmission.includes(fraction.status)) await judgeFraction(recorder, fraction);
    });
  }
}
