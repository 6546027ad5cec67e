import type { Recorder } from '@/lib/audit/recorded';
import { newId } from '@/lib/database/ids';
import { type EvidenceFile, type Integration, type Peak, Trace } from '@/lib/database/records';
import { assumedDetector, detectorNamedIn } from './detector-word';
import type { Integration as IntegrationFound } from './integration';
import { defaultIntegrationParameters } from './parameters';
import { integratePoints, type ParsedTrace, parseTrace } from './parse-trace';
import type { ReadOptions, TraceSubject } from './schema';
import { writeIntegration } from './write-integration';

/** A file read and integrated, ready to be written: everything heavy is done. */
export type PreparedTrace = ParsedTrace & { read: ReadOptions; found: IntegrationFound };

/** How a trace was read: kept in the trace's `readOptions`. */
export type KeptReadOptions = { read: ReadOptions; automatic: boolean; detectorAssumed: boolean };

/** First integration of parsed points, with the parameters that nobody chose. */
export function prepareTrace(parsed: ParsedTrace, read: ReadOptions): PreparedTrace {
  return { ...parsed, read, found: integratePoints(parsed.points, defaultIntegrationParameters) };
}

export type TraceToRead = {
  evidence: Pick<EvidenceFile, 'id' | 'fileName' | 'mediaType'>;
  /** Of the file, or what prepareTrace made of them before the transaction began. */
  bytes?: Uint8Array;
  prepared?: PreparedTrace;
  fraction?: { id: string } | null;
  run: { id: string; groupId: string };
  subject: TraceSubject;
  detector?: string | null;
  read?: ReadOptions;
  /** Read on arrival: no person has looked at how. */
  automatic?: boolean;
  /** Who stands under the first integration; the actor when left out. */
  authorName?: string;
};

/**
 * Writes a trace of an evidence file with its first integration and peaks. The caller holds the lock of the fraction
 * (or of the run) and calls fractionChanged afterwards. Give `prepared` for long traces, so that the transaction is short.
 */
export async function readTraceFromEvidence(
  recorder: Recorder,
  input: TraceToRead,
): Promise<{ trace: Trace; integration: Integration; peaks: Peak[] }> {
  const { transaction, record, actor } = recorder;
  const read = input.read ?? {};
  const prepared =
    input.prepared ?? prepareTrace(parseTrace(requireBytes(input), input.evidence.mediaType, read), read);
  const named =
    input.detector ?? detectorNamedIn(input.evidence.fileName, prepared.detected.columns.join(' '));
  const { timeMin } = prepared.points;
  const kept: KeptReadOptions = {
    read: prepared.read,
    automatic: input.automatic ?? false,
    detectorAssumed: named === null,
  };
  const trace = await Trace.create(
    {
      id: newId(),
      groupId: input.run.groupId,
      runId: input.run.id,
      fractionId: input.fraction?.id ?? null,
      evidenceId: input.evidence.id,
      subject: input.subject,
      detector: named ?? assumedDetector,
      readOptions: kept,
      detected: { ...prepared.detected },
      ...extentOf(timeMin),
    },
    { transaction },
  );
  record({
    type: 'trace.read',
    recordType: 'trace',
    recordId: trace.id,
    groupId: trace.groupId,
    after: traceFacts(trace),
  });
  const written = await writeIntegration(recorder, trace, {
    found: prepared.found,
    parameters: defaultIntegrationParameters,
    read: prepared.read,
    reason: null,
    author: {
      id: actor.kind === 'user' && !input.automatic ? actor.userId : null,
      name: input.authorName ?? actor.name,
    },
    compoundIds: new Map(),
  });
  return { trace, ...written };
}

function requireBytes({ bytes }: TraceToRead): Uint8Array {
  if (!bytes) throw new Error('readTraceFromEvidence needs the bytes or what was prepared from them');
  return bytes;
}

/** Number of points, first time and length of a trace. */
export function extentOf(timeMin: Float64Array) {
  const startMin = timeMin[0] ?? 0;
  return {
    pointCount: timeMin.length,
    startMin,
    durationMin: (timeMin[timeMin.length - 1] ?? startMin) - startMin,
  };
}

/** What the audit trail keeps of a trace. */
export function traceFacts(trace: Trace): Record<string, unknown> {
  const { evidenceId, fractionId, runId, subject, detector, readOptions, detected, pointCount, durationMin } =
    trace;
  return { evidenceId, fractionId, runId, subject, detector, readOptions, detected, pointCount, durationMin };
}
