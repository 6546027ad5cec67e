import { Op, type Transaction } from 'sequelize';
import { z } from 'zod';
import { Trace } from '@/lib/database/records';
import { findIntegrationsInForce } from '@/lib/evidence/gc/find-integrations-in-force';
import type { TraceInput } from './judge-inputs';

/** What an integration was told, and what it kept out of its table. */
const parametersSchema = z.object({
  minimumAreaPercent: z.number().default(0),
  minimumSignalToNoise: z.number().default(0),
  exclude: z
    .array(
      z.object({ fromMin: z.number(), toMin: z.number(), reason: z.string().default('no reason given') }),
    )
    .default([]),
});
const keptOutSchema = z.object({
  disregardedPeakCount: z.number().default(0),
  excludedPeaks: z.array(z.object({ retentionTimeMin: z.number(), area: z.number() })).default([]),
});

/** A bare list of baseline corners tells nothing of peaks kept out. */
function detailOf(baseline: unknown): unknown {
  return baseline === undefined || baseline === null || Array.isArray(baseline) ? {} : baseline;
}

/** The fraction's traces, and the run's crude and references, each with the peaks of its integration in force. */
export async function gatherTraces(
  fraction: { id: string; runId: string },
  transaction?: Transaction,
): Promise<TraceInput[]> {
  const traces = await Trace.findAll({
    where: {
      runId: fraction.runId,
      [Op.or]: [{ fractionId: fraction.id }, { fractionId: null }, { subject: { [Op.ne]: 'fraction' } }],
    },
    order: [['id', 'ASC']],
    transaction,
  });
  const inForce = await findIntegrationsInForce(traces, transaction);
  return traces.map((trace) => {
    const { integration, peaks = [] } = inForce.get(trace.id) ?? {};
    const parameters = parametersSchema.parse(integration?.parameters ?? {});
    const keptOut = keptOutSchema.parse(detailOf(integration?.baseline));
    return {
      traceId: trace.id,
      subject:
        trace.fractionId === fraction.id
          ? trace.subject
          : trace.subject === 'fraction'
            ? 'reference'
            : trace.subject,
      detector: trace.detector,
      integrationNumber: integration?.number ?? null,
      minimumAreaPercent: parameters.minimumAreaPercent,
      minimumSignalToNoise: parameters.minimumSignalToNoise,
      disregardedPeakCount: keptOut.disregardedPeakCount,
      excluded: parameters.exclude,
      excludedPeaks: keptOut.excludedPeaks,
      peaks: peaks.map((peak) => ({
        number: peak.number,
        retentionTimeMin: peak.retentionTimeMin,
        widthHalfMin: peak.widthHalfMin,
        areaPercent: peak.areaPercent,
        signalToNoise: peak.signalToNoise,
        compoundId: peak.compoundId,
      })),
    };
  });
}
