import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import type { Recorder } from '@/lib/audit/recorded';
import { Fraction } from '@/lib/database/records';

/**
 * Ends the signatures of the run's signed-off fractions during whose collection one of the new readings lies: from
 * the receiver put on to the next one, the last one without an end. The head curve is under what was signed.
 */
export async function supersedeByReadings(
  recorder: Recorder,
  runId: string,
  times: readonly Date[],
): Promise<void> {
  const { transaction } = recorder;
  const fractions = await Fraction.findAll({
    where: { runId },
    attributes: ['id', 'status', 'collectedAt'],
    order: [['id', 'ASC']],
    transaction,
  });
  for (const { id, status, collectedAt } of fractions) {
    if (status !== 'signed off') continue;
    const from = collectedAt.getTime();
    const later = fractions.map((one) => one.collectedAt.getTime()).filter((time) => time > from);
    const to = later.reduce((a, b) => Math.min(a, b), Infinity);
    if (!times.some((time) => time.getTime() >= from && time.getTime() < to)) continue;
    const fraction = await Fraction.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
    if (fraction?.status === 'signed off')
      await fractionChanged(recorder, fraction, 'log readings of its collection added');
  }
}
