import type { Transaction } from 'sequelize';
import { Integration, Peak, type Trace } from '@/lib/database/records';

export type IntegrationInForce = { integration: Integration; peaks: Peak[] };

/** The integration in force of each trace, by the trace's id, with its peaks by number; two queries for any number. */
export async function findIntegrationsInForce(
  traces: readonly Trace[],
  transaction?: Transaction,
): Promise<Map<string, IntegrationInForce>> {
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
  return new Map(
    integrations.map((integration) => [
      integration.traceId,
      { integration, peaks: peaks.filter((peak) => peak.integrationId === integration.id) },
    ]),
  );
}
