import { Op } from 'sequelize';
import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { judgeFraction } from '@/lib/acceptance/judge-fraction';
import type { Recorder } from '@/lib/audit/recorded';
import { Fraction } from '@/lib/database/records';
import type { LockedPlace } from './require-trace';

/**
 * After a trace was written. Under a fraction its signatures are superseded and it is judged anew. A trace of the
 * whole run (crude, blank, reference) tells retention times to all its fractions: those that nobody has signed are
 * judged anew, a signed one stays as it was signed.
 */
export async function placeChanged(recorder: Recorder, place: LockedPlace, what: string): Promise<void> {
  if (place.fraction) return fractionChanged(recorder, place.fraction, what);
  const { transaction } = recorder;
  const fractions = await Fraction.findAll({
    where: { runId: place.run.id, status: { [Op.ne]: 'signed off' } },
    order: [['id', 'ASC']],
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  for (const fraction of fractions) await judgeFraction(recorder, fraction);
}
