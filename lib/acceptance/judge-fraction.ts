import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import type { Recorder } from '@/lib/audit/recorded';
import { newId } from '@/lib/database/ids';
import { type Fraction, Peak, Trace, Verdict } from '@/lib/database/records';
import { targetPurity } from './target-purity';

/**
 * Judges a fraction whose row is locked, and stores the verdict when it differs from the last one.
 */
export async function judgeFraction(recorder: Recorder, fraction: Fraction): Promise<void> {
  const { transaction, record } = recorder;
  const trace = await Trace.findOne({
    where: { fractionId: fraction.id, subject: 'fraction' },
    order: [['createdAt', 'DESC']],
    transaction,
  });
  const peaks = trace?.inForceIntegrationId
    ? await Peak.findAll({ where: { integrationId: trace.inForceIntegrationId }, transaction })
    : [];
  const purity = targetPurity(peaks, fraction.compoundId)?.areaPercent ?? null;
  const content = {
    engineVersion: 'verdict-0',
    state: 'incomplete' as const,
    criteria: [],
    coverage: [],
    purityPercent: purity,
  };
  const contentDigest = createHash('sha256')
    .update(canonicalize(content) as string, 'utf8')
    .digest('hex');
  const last = fraction.verdictId ? await Verdict.findByPk(fraction.verdictId, { transaction }) : null;
  if (last?.contentDigest === contentDigest) return;
  const verdict = await Verdict.create(
    {
      id: newId(),
      fractionId: fraction.id,
      state: content.state,
      criteria: content.criteria,
      coverage: content.coverage,
      engineVersion: content.engineVersion,
      contentDigest,
    },
    { transaction },
  );
  const before = { verdictState: fraction.verdictState, purityPercent: fraction.purityPercent };
  await fraction.update(
    { verdictId: verdict.id, verdictState: content.state, purityPercent: purity },
    { transaction },
  );
  record({
    type: 'fraction.judged',
    recordType: 'fraction',
    recordId: fraction.id,
    groupId: fraction.groupId,
    before,
    after: { verdictState: content.state, purityPercent: purity, engineVersion: content.engineVersion },
  });
}
