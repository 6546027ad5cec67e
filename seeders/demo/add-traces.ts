import { type Fraction, Integration, Peak, Trace } from '@/lib/database/records';
import { createTrace } from '@/lib/evidence/gc/create-trace';
import { integrateTrace } from '@/lib/evidence/gc/integrate-trace';
import type { LaidOutRun } from './lay-out-run';
import type { Team } from './people';
import type { Composition, CutPlan } from './run-plan';
import { sendFile } from './send-file';
import { requireSubstance } from './substances';
import { areaPercents, writeTrace } from './write-trace';

/** Furthest a peak may lie from where its compound is expected, min. */
const WINDOW_MIN = 0.08;

/** Confirms how the file was read and says which peak is which compound, as the analyst does. Once a trace. */
async function assignPeaks(team: Team, traceId: string, composition: Composition): Promise<void> {
  const trace = await Trace.findByPk(traceId, { rejectOnEmpty: true });
  if ((await Integration.count({ where: { traceId } })) > 1) return;
  const peaks = await Peak.findAll({ where: { integrationId: trace.inForceIntegrationId! } });
  const expected = Object.keys(composition).flatMap((cas) =>
    requireSubstance(cas).peaks.map(({ atMin }) => ({ cas, atMin })),
  );
  const assign = peaks.flatMap(({ number, retentionTimeMin }) => {
    const near = expected.find(({ atMin }) => Math.abs(atMin - retentionTimeMin) < WINDOW_MIN);
    return near ? [{ peak: number, compound: near.cas }] : [];
  });
  await integrateTrace(team.analyst.actor, traceId, {
    reason: 'Peaks assigned by the retention times of reference standards (invented).',
    assign,
  });
}

async function addFractionTrace(team: Team, { plan }: LaidOutRun, fraction: Fraction, cut: CutPlan) {
  const detector = cut.trace!;
  const evidence = await sendFile(
    team.analyst.actor,
    { fraction: fraction.code },
    {
      bytes: writeTrace(`${plan.lot} F${fraction.number}`, cut.composition, detector),
      fileName: `${fraction.code}_${detector}_invented.csv`,
      kind: 'gc-trace',
      takenAt: fraction.collectedAt,
    },
  );
  const { traceId } = await createTrace(team.analyst.actor, {
    evidenceId: evidence.id,
    fraction: fraction.code,
    subject: 'fraction',
    detector,
  });
  await assignPeaks(team, traceId, Object.fromEntries(areaPercents(cut.composition, detector)));
}

/** The crude's trace, and those of the fractions that have one: sent, read, integrated and assigned by the real code. */
export async function addTraces(team: Team, laidOut: LaidOutRun): Promise<void> {
  const { plan, run, fractions } = laidOut;
  const measured = plan.cuts.flatMap((cut, at) => (cut.trace ? [{ cut, fraction: fractions[at]! }] : []));
  if (measured.length === 0) return;
  const detector = measured[0]!.cut.trace!;
  const evidence = await sendFile(
    team.analyst.actor,
    { run: run.code },
    {
      bytes: writeTrace(`${plan.lot} crude`, plan.crude, detector),
      fileName: `${run.code}_crude_${detector}_invented.csv`,
      kind: 'gc-trace',
      takenAt: run.startedAt,
    },
  );
  const body = { evidenceId: evidence.id, run: run.code, subject: 'crude', detector } as const;
  const { traceId } = await createTrace(team.analyst.actor, body);
  await assignPeaks(team, traceId, Object.fromEntries(areaPercents(plan.crude, detector)));
  for (const { cut, fraction } of measured) {
    if (await isPastWork(fraction)) continue;
    await addFractionTrace(team, laidOut, fraction, cut);
  }
}

/** A fraction that has been submitted in an earlier, interrupted seeding has its evidence already. */
export async function isPastWork(fraction: Fraction): Promise<boolean> {
  await fraction.reload();
  return fraction.status !== 'open';
}
