import type { Compound, Integration, Peak, Trace, Verdict } from '@/models';
import type { FractionPlate } from '@/lib/signoff/list-fraction-plates';
import type { FractionSheet } from './fraction-sheet-schema';
import { judgeFractionBoilingRange, USUAL_BOILING_TOLERANCE_C } from './fraction-boiling-range';
import type { JudgeInputs, SpecificationInput } from './judge-inputs';
import type { Judgement } from './verdict';

type StoredCriteria = { summary: string; results: FractionSheet['verdict']['criteria'] };

/** The stored verdict as JSON; for a fraction that was never judged, what judging gives now. */
export function presentVerdict(
  verdict: Verdict | null,
  now: Judgement | null,
  specification: SpecificationInput | null,
): { verdict: FractionSheet['verdict']; coverage: FractionSheet['coverage'] } {
  if (verdict) {
    const { summary, results } = verdict.criteria as StoredCriteria;
    return {
      verdict: {
        state: verdict.state,
        summary,
        criteria: results,
        engineVersion: verdict.engineVersion,
        judgedAt: verdict.createdAt.toISOString(),
        specification,
      },
      coverage: verdict.coverage as FractionSheet['coverage'],
    };
  }
  if (!now) throw new Error('A fraction without a verdict has to be judged to be shown');
  const { state, summary, criteria, engineVersion, coverage } = now;
  return { verdict: { state, summary, criteria, engineVersion, judgedAt: null, specification }, coverage };
}

export function presentSheetPlate(plate: FractionPlate): FractionSheet['plates'][number] {
  return {
    id: plate.id,
    stationaryPhase: plate.stationaryPhase,
    eluent: plate.eluent,
    photos: plate.photos.map(({ id, evidenceId, visualiser, flags }) => ({
      id,
      evidenceId,
      visualiser,
      flags,
    })),
    lanes: plate.lanes.map((lane) => ({
      id: lane.id,
      label: lane.label,
      spots: lane.spots.map(({ photoId, rf, rfUncertainty, flags }) => ({
        photoId,
        rf,
        rfUncertainty,
        flags,
      })),
    })),
  };
}

export function presentSheetTrace(
  trace: Trace,
  integrations: Integration[],
  peaks: Peak[],
  compounds: Compound[],
): FractionSheet['traces'][number] {
  const inForce = integrations.find((one) => one.id === trace.inForceIntegrationId);
  return {
    id: trace.id,
    evidenceId: trace.evidenceId,
    subject: trace.subject,
    detector: trace.detector,
    durationMin: trace.durationMin,
    integrations: integrations.length,
    integration: inForce
      ? {
          id: inForce.id,
          number: inForce.number,
          methodVersion: inForce.methodVersion,
          reason: inForce.reason,
          author: inForce.authorName,
          createdAt: inForce.createdAt.toISOString(),
          flags: inForce.flags,
          peaks: peaks.map(({ number, retentionTimeMin, areaPercent, signalToNoise, flags, compoundId }) => ({
            number,
            retentionTimeMin,
            areaPercent,
            signalToNoise,
            flags,
            compound: compounds.find((compound) => compound.id === compoundId)?.name ?? null,
          })),
        }
      : null,
  };
}

/** The boiling range as the sheet shows it, with the tolerance of the specification or the usual one. */
export function presentBoilingRange(inputs: JudgeInputs): FractionSheet['boilingRange'] {
  const limit = inputs.specification?.criteria.boilingRange ?? { toleranceC: USUAL_BOILING_TOLERANCE_C };
  const judged = judgeFractionBoilingRange(inputs.head, inputs.target, limit);
  const base = { toleranceC: limit.toleranceC, pressureMbar: inputs.head.pressureMbar };
  if (judged.state === 'missing') {
    const nothing = { expectedC: null, uncertaintyC: null, method: null, source: null, notes: [] };
    const { fromC, toC } = inputs.head;
    return { ...base, ...nothing, state: 'missing', reason: judged.reason, lowC: fromC, highC: toC };
  }
  const { result, expected } = judged;
  return {
    ...base,
    state: result.state,
    reason: result.reason,
    lowC: result.lowC,
    highC: result.highC,
    expectedC: expected.boilingPointC,
    uncertaintyC: result.uncertaintyC,
    method: expected.method,
    source: expected.source,
    notes: [...expected.notes, ...result.notes],
  };
}
