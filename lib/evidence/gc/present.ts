import { cleanPercent } from '@/lib/acceptance/clean-percent';
import type { CompoundRef } from '@/lib/distillation/quantities';
import { presentCompoundRef } from '@/lib/distillation/present';
import type { Compound, EvidenceFile, Fraction, Integration, Peak, Run, Trace } from '@/models';
import { integrationParametersSchema } from './parameters';
import type { KeptReadOptions } from './read-trace';
import {
  detectedSchema,
  type IntegrationJson,
  integrationDetailSchema,
  type IntegrationRow,
  type PeakJson,
  type TraceJson,
  type TraceRow,
} from './schema';

function presentPeak(peak: Peak, compound: CompoundRef | null): PeakJson {
  return {
    number: peak.number,
    retentionTimeMin: peak.retentionTimeMin,
    startMin: peak.startMin,
    endMin: peak.endMin,
    area: peak.area,
    areaPercent: cleanPercent(peak.areaPercent),
    height: peak.height,
    widthHalfMin: peak.widthHalfMin ?? null,
    tailing: peak.tailing ?? null,
    plates: peak.plates ?? null,
    resolution: peak.resolution ?? null,
    signalToNoise: peak.signalToNoise ?? null,
    flags: peak.flags,
    compound,
  };
}

/** One version of an integration with its peaks and the compounds that they are assigned to. */
export function presentIntegration(
  integration: Integration,
  peaks: readonly Peak[],
  compounds: readonly Compound[],
  inForceId: string | null,
): IntegrationJson {
  const refs = new Map(compounds.map((compound) => [compound.id, presentCompoundRef(compound)]));
  const detail = integrationDetailSchema.parse(integration.baseline);
  return {
    ...presentIntegrationFacts(integration, inForceId),
    traceId: integration.traceId,
    methodVersion: integration.methodVersion,
    parameters: integrationParametersSchema.parse(integration.parameters),
    peaks: peaks.map((peak) =>
      presentPeak(peak, peak.compoundId ? (refs.get(peak.compoundId) ?? null) : null),
    ),
    flags: integration.flags,
    noise: integration.noise,
    noiseMethod: detail.noiseMethod,
    totalArea: detail.totalArea,
    baseline: { timeMin: detail.timeMin, signal: detail.signal },
    excludedPeaks: detail.excludedPeaks,
    negativeDips: detail.negativeDips,
    disregardedPeakCount: detail.disregardedPeakCount,
    read: detail.read,
  };
}

function presentIntegrationFacts(integration: Integration, inForceId: string | null) {
  return {
    id: integration.id,
    version: integration.number,
    inForce: integration.id === inForceId,
    reason: integration.reason ?? null,
    author: integration.authorName,
    createdAt: integration.createdAt.toISOString(),
  };
}

export function presentIntegrationRow(
  integration: Integration,
  inForceId: string | null,
  peakCount: number,
): IntegrationRow {
  return { ...presentIntegrationFacts(integration, inForceId), peakCount };
}

type Place = {
  evidence: Pick<EvidenceFile, 'id' | 'fileName' | 'sha256'>;
  run: Pick<Run, 'code'>;
  fraction: Pick<Fraction, 'code'> | null;
};

/** A trace in a list. */
export function presentTraceRow(trace: Trace, { evidence, run, fraction }: Place): TraceRow {
  const kept = trace.readOptions as KeptReadOptions;
  return {
    id: trace.id,
    version: trace.version,
    run: run.code,
    fraction: fraction?.code ?? null,
    subject: trace.subject,
    detector: trace.detector,
    detectorAssumed: kept.detectorAssumed,
    confirmed: !kept.automatic,
    evidence: { id: evidence.id, fileName: evidence.fileName, sha256: evidence.sha256 },
    pointCount: trace.pointCount,
    startMin: trace.startMin,
    durationMin: trace.durationMin,
    integrationId: trace.inForceIntegrationId ?? null,
    createdAt: trace.createdAt.toISOString(),
  };
}

/** A trace with how its file was read and its integration in force. */
export function presentTrace(trace: Trace, place: Place, integration: IntegrationJson): TraceJson {
  return {
    ...presentTraceRow(trace, place),
    read: (trace.readOptions as KeptReadOptions).read,
    detected: detectedSchema.parse(trace.detected),
    integration,
  };
}
