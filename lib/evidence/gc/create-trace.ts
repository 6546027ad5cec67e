import canonicalize from 'canonicalize';
import { type Recorder, recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Trace } from '@/lib/database/records';
import { findTracePlace, type TracePlace } from './find-place';
import { defaultIntegrationParameters } from './parameters';
import { placeChanged } from './place-changed';
import {
  extentOf,
  type KeptReadOptions,
  type PreparedTrace,
  prepareTrace,
  readTraceFromEvidence,
  traceFacts,
} from './read-trace';
import { lockPlace } from './require-trace';
import type { NewTrace } from './schema';
import { readTracePoints } from './trace-points';
import { writeIntegration } from './write-integration';

export type TraceRead = { traceId: string; changed: boolean };

/**
 * Reads a trace from an evidence file, or confirms or corrects how one was read before: the points then come from the
 * new reading, and an integration of them is added. `changed` is false when it had been read just so already.
 * 404, 403, 409, and 422 for a file that cannot be read.
 */
export async function createTrace(actor: Actor, body: NewTrace): Promise<TraceRead> {
  const place = await findTracePlace(actor, body);
  authorise(actor, 'trace.write', place.run.groupId);
  const where = {
    evidenceId: place.evidence.id,
    fractionId: place.fraction?.id ?? null,
    subject: body.subject,
    runId: place.run.id,
  };
  const before = await Trace.findOne({ where });
  const read = body.read ?? (before ? keptOf(before).read : {});
  // Parsing and integrating takes its time: it is done before the transaction begins.
  const prepared = prepareTrace(await readTracePoints(place.evidence, read), read);
  return recorded(actor, async (recorder) => {
    const { transaction } = recorder;
    const codes = { fractionCode: place.fraction?.code ?? null, runCode: place.run.code };
    const locked = await lockPlace(actor, codes, transaction);
    const existing = await Trace.findOne({ where, transaction, lock: transaction.LOCK.UPDATE });
    const result = existing
      ? await readAgain(recorder, existing, prepared, body)
      : await readFirst(recorder, place, prepared, body);
    if (result.changed) await placeChanged(recorder, locked, 'trace read');
    return result;
  });
}

export function keptOf(trace: Trace): KeptReadOptions {
  return trace.readOptions as KeptReadOptions;
}

async function readFirst(
  recorder: Recorder,
  place: TracePlace,
  prepared: PreparedTrace,
  body: NewTrace,
): Promise<TraceRead> {
  const { subject, detector } = body;
  const { trace } = await readTraceFromEvidence(recorder, { ...place, prepared, subject, detector });
  return { traceId: trace.id, changed: true };
}

async function readAgain(
  recorder: Recorder,
  trace: Trace,
  prepared: PreparedTrace,
  body: NewTrace,
): Promise<TraceRead> {
  const { transaction, record, actor } = recorder;
  const kept = keptOf(trace);
  const otherRead = canonicalize(kept.read) !== canonicalize(prepared.read);
  const otherDetector = body.detector !== undefined && body.detector !== trace.detector;
  if (!otherRead && !otherDetector && !kept.automatic) return { traceId: trace.id, changed: false };
  const before = traceFacts(trace);
  const options: KeptReadOptions = {
    read: prepared.read,
    automatic: false,
    detectorAssumed: kept.detectorAssumed && body.detector === undefined,
  };
  await trace.update(
    {
      readOptions: options,
      detected: { ...prepared.detected },
      detector: body.detector ?? trace.detector,
      ...extentOf(prepared.points.timeMin),
    },
    { transaction },
  );
  record({
    type: 'trace.read',
    recordType: 'trace',
    recordId: trace.id,
    groupId: trace.groupId,
    before,
    after: traceFacts(trace),
  });
  if (otherRead) {
    await writeIntegration(recorder, trace, {
      found: prepared.found,
      parameters: defaultIntegrationParameters,
      read: prepared.read,
      reason: 'The file was read again in another way.',
      author: { id: actor.kind === 'user' ? actor.userId : null, name: actor.name },
      compoundIds: new Map(),
    });
  }
  return { traceId: trace.id, changed: true };
}
