import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { type EvidenceFile, Fraction, Run, Trace } from '@/lib/database/records';
import { placeChanged } from './place-changed';
import { prepareTrace, readTraceFromEvidence } from './read-trace';
import { lockPlace } from './require-trace';
import { readTracePoints } from './trace-points';

/**
 * Reads a trace file that has come for a fraction, with everything detected, so that the fraction is judged at once;
 * an analyst confirms or corrects the reading later. Does nothing the second time, and nothing for a file of a whole
 * run, of which only a person can say what it shows. Throws a Problem where the file cannot be read: the file stays.
 */
export async function readTraceAfterStored(actor: Actor, evidence: EvidenceFile): Promise<void> {
  const fraction = evidence.fractionId ? await Fraction.findByPk(evidence.fractionId) : null;
  const run = fraction ? await Run.findByPk(fraction.runId) : null;
  if (!fraction || !run) return;
  const where = { evidenceId: evidence.id, fractionId: fraction.id };
  if (await Trace.findOne({ where })) return;
  const prepared = prepareTrace(await readTracePoints(evidence, {}), {});
  await recorded(actor, async (recorder) => {
    const { transaction } = recorder;
    const codes = { fractionCode: fraction.code, runCode: run.code };
    const locked = await lockPlace(actor, codes, transaction);
    if (await Trace.findOne({ where, transaction, lock: transaction.LOCK.UPDATE })) return;
    await readTraceFromEvidence(recorder, {
      evidence,
      prepared,
      fraction,
      run,
      subject: 'fraction',
      automatic: true,
      authorName: 'Heartcut, on arrival',
    });
    await placeChanged(recorder, locked, 'trace read on arrival');
  });
}
