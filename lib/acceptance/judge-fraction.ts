import type { Recorder } from '@/lib/audit/recorded';
import { newId } from '@/lib/database/ids';
import { type Fraction, Verdict } from '@/lib/database/records';
import { digestOf } from './digest';
import { gatherInputs } from './gather-inputs';
import { judge } from './verdict';

/**
 * Judges a fraction whose row is locked. Stores a new verdict when it differs from the last one (verdicts
 * are only ever added), and the fraction's verdict, state and purity (area %) with it.
 */
export async function judgeFraction(recorder: Recorder, fraction: Fraction): Promise<void> {
  const { transaction, record } = recorder;
  const inputs = await gatherInputs(fraction, transaction);
  const { state, summary, criteria, coverage, purityPercent, engineVersion } = judge(inputs);
  const specificationId = inputs.specification?.id ?? null;
  const contentDigest = digestOf({
    state,
    summary,
    criteria,
    coverage,
    purityPercent,
    engineVersion,
    specificationId,
  });
  const last = fraction.verdictId ? await Verdict.findByPk(fraction.verdictId, { transaction }) : null;
  if (last?.contentDigest === contentDigest) return;
  const verdict = await Verdict.create(
    {
      id: newId(),
      fractionId: fraction.id,
      specificationId,
      state,
      criteria: { summary, results: criteria },
      coverage,
      engineVersion,
      contentDigest,
    },
    { transaction },
  );
  const before = { verdictState: fraction.verdictState, purityPercent: fraction.purityPercent };
  await fraction.update({ verdictId: verdict.id, verdictState: state, purityPercent }, { transaction });
  record({
    type: 'fraction.judged',
    recordType: 'fraction',
    recordId: fraction.id,
    groupId: fraction.groupId,
    before,
    after: { verdictState: state, purityPercent, verdictId: verdict.id, specificationId, engineVersion },
  });
}
