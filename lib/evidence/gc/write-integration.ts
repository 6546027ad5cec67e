import type { Recorder } from '@/lib/audit/recorded';
import { newId } from '@/lib/database/ids';
import { Integration, Peak, type Trace } from '@/lib/database/records';
import type { Integration as IntegrationFound } from './integration';
import type { IntegrationParameters } from './parameters';
import type { IntegrationDetail, ReadOptions } from './schema';

export type IntegrationToWrite = {
  found: IntegrationFound;
  parameters: IntegrationParameters;
  read: ReadOptions;
  reason: string | null;
  author: { id: string | null; name: string };
  /** By peak number. */
  compoundIds: ReadonlyMap<number, string>;
};

/**
 * Adds the next version of a trace's integration and puts it in force. The trace's row must be locked: its number is
 * counted here. Earlier versions stay as they are.
 */
export async function writeIntegration(
  { transaction, record }: Recorder,
  trace: Trace,
  input: IntegrationToWrite,
): Promise<{ integration: Integration; peaks: Peak[] }> {
  const { found, parameters } = input;
  const last = ((await Integration.max('number', { where: { traceId: trace.id }, transaction })) ??
    0) as number;
  const detail: IntegrationDetail = {
    timeMin: found.baseline.timeMin,
    signal: found.baseline.signal,
    totalArea: found.totalArea,
    disregardedPeakCount: found.disregardedPeakCount,
    excludedPeaks: found.excludedPeaks,
    negativeDips: found.negativeDips,
    noiseMethod: found.noise.method,
    read: input.read,
  };
  const integration = await Integration.create(
    {
      id: newId(),
      traceId: trace.id,
      number: last + 1,
      methodVersion: found.methodVersion,
      parameters,
      reason: input.reason,
      authorId: input.author.id,
      authorName: input.author.name,
      noise: found.noise.peakToPeak,
      baseline: detail,
      flags: found.flags,
    },
    { transaction },
  );
  const peaks = await Peak.bulkCreate(
    found.peaks.map((peak) => ({
      ...peak,
      id: newId(),
      integrationId: integration.id,
      compoundId: input.compoundIds.get(peak.number) ?? null,
    })),
    { transaction },
  );
  const before = trace.inForceIntegrationId;
  await trace.update({ inForceIntegrationId: integration.id }, { transaction });
  record({
    type: 'trace.integrated',
    recordType: 'trace',
    recordId: trace.id,
    groupId: trace.groupId,
    before: before ? { inForceIntegrationId: before, version: last } : null,
    after: {
      inForceIntegrationId: integration.id,
      version: integration.number,
      methodVersion: integration.methodVersion,
      parameters,
      peaks: peaks.map(({ number, retentionTimeMin, areaPercent, compoundId }) => ({
        number,
        retentionTimeMin,
        areaPercent,
        compoundId,
      })),
    },
    reason: input.reason,
  });
  return { integration, peaks };
}
