import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import {
  Compound,
  FractionTransition,
  Group,
  Integration,
  Peak,
  RefractiveReading,
  Signature,
  Trace,
  Verdict,
} from '@/lib/database/records';
import { presentFraction } from '@/lib/distillation/present';
import { type FractionWithRun, requireFraction } from '@/lib/distillation/require-fraction';
import { presentEvidence } from '@/lib/evidence/present';
import { presentRefractiveReading } from '@/lib/evidence/refractive-index/present';
import { placesOf } from '@/lib/evidence/require-evidence';
import { listFractionEvidence } from '@/lib/signoff/list-fraction-evidence';
import { listFractionPlates } from '@/lib/signoff/list-fraction-plates';
import { presentSignature } from '@/lib/signoff/present-signature';
import { presentFractionActions } from '@/lib/signoff/sign-off-rules';
import type { FractionSheet } from './fraction-sheet-schema';
import { gatherInputs } from './gather-inputs';
import {
  presentBoilingRange,
  presentSheetPlate,
  presentSheetTrace,
  presentVerdict,
} from './present-sheet-parts';
import { judge } from './verdict';

export { fractionSheetSchema } from './fraction-sheet-schema';

async function sheetTraces(fractionId: string): Promise<FractionSheet['traces']> {
  const traces = await Trace.findAll({ where: { fractionId }, order: [['id', 'ASC']] });
  const integrations = await Integration.findAll({
    where: { traceId: traces.map((trace) => trace.id) },
    attributes: { exclude: ['baseline'] },
  });
  const peaks = await Peak.findAll({
    where: { integrationId: traces.flatMap((trace) => trace.inForceIntegrationId ?? []) },
    order: [['number', 'ASC']],
  });
  const compounds = await Compound.findAll({
    where: { id: [...new Set(peaks.flatMap((peak) => peak.compoundId ?? []))] },
  });
  return traces.map((trace) =>
    presentSheetTrace(
      trace,
      integrations.filter((one) => one.traceId === trace.id),
      peaks.filter((peak) => peak.integrationId === trace.inForceIntegrationId),
      compounds,
    ),
  );
}

async function sheetHistory(fractionId: string): Promise<Pick<FractionSheet, 'signatures' | 'transitions'>> {
  const signatures = await Signature.findAll({ where: { fractionId }, order: [['signedAt', 'DESC']] });
  const transitions = await FractionTransition.findAll({
    where: { fractionId },
    order: [
      ['at', 'DESC'],
      ['id', 'DESC'],
    ],
  });
  return {
    signatures: signatures.map(presentSignature),
    transitions: transitions.map(({ action, fromStatus, toStatus, reason, actorName, at }) => ({
      action,
      from: fromStatus,
      to: toStatus,
      reason,
      by: actorName,
      at: at.toISOString(),
    })),
  };
}

/** Everything of a fraction but what its reader may do; for the sheet and for a shared link. */
export async function buildFractionSheet(fraction: FractionWithRun): Promise<Omit<FractionSheet, 'actions'>> {
  const inputs = await gatherInputs(fraction);
  const stored = fraction.verdictId ? await Verdict.findByPk(fraction.verdictId) : null;
  const group = await Group.findByPk(fraction.groupId);
  const evidence = await listFractionEvidence(fraction.id);
  const places = await placesOf(evidence);
  const readings = await RefractiveReading.findAll({
    where: { fractionId: fraction.id },
    order: [['id', 'DESC']],
  });
  return {
    ...presentFraction(fraction),
    group: { id: fraction.groupId, name: group?.name ?? '' },
    ...presentVerdict(stored, stored ? null : judge(inputs), inputs.specification),
    evidence: evidence.map((file) => presentEvidence(file, places.get(file.id)!)),
    plates: (await listFractionPlates(fraction.id)).map(presentSheetPlate),
    traces: await sheetTraces(fraction.id),
    refractiveReadings: readings.map((reading) => presentRefractiveReading(reading, fraction.code)),
    boilingRange: presentBoilingRange(inputs),
    ...(await sheetHistory(fraction.id)),
  };
}

/**
 * The evidence sheet of a fraction that the actor may see (404 otherwise; 403 for a token, which only sends):
 * evidence, what was read from it, verdict, coverage, signatures, and what the actor may do next.
 */
export async function presentFractionSheet(actor: Actor, code: string): Promise<FractionSheet> {
  requirePerson(actor);
  const fraction = await requireFraction(actor, code);
  const sheet = await buildFractionSheet(fraction);
  return { ...sheet, actions: presentFractionActions(actor, fraction) };
}
