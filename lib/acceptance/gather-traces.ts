import { Op, type Transaction } from 'sequelize';
import { z } from 'zod';
import { Integration, Peak, Trace } from '@/lib/database/records';
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
  const ids = traces.flatMap((trace) => trace.inForceIntegrationId ?? []);
  const integrations = await Integration.findAll({ where: { id: ids }, transaction });
  const peaks = await Peak.findAll({
    where: { integrationId: ids },
    order: [
      ['integrationId', 'ASC'],
      ['number', 'ASC'],
    ],
    transaction,
  });
  return traces.map((trace) => {
    const integration = integrations.find((one) => one.id === trace.inForceIntegrationId);
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
      peaks: peaks
        .filter((peak) => integration && peak.integrationId === integration.id)
        .map((peak) => ({
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
