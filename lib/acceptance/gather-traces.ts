import { Op, type Transaction } from 'sequelize';
import { z } from 'zod';
import { Trace } from '@/lib/database/records';
import { findIntegrationsInForce } from '@/lib/evidence/gc/find-integrations-in-force';
import type { TraceInput } from './judge-inputs';

const exclusions = z.array(z.object({ fromMin: z.number(), toMin: z.number() })).catch([]);

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
      excluded: exclusions.parse(integration?.parameters?.exclude ?? []),
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
