import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { decimateTrace } from './decimate';
import { detectorNamedIn } from './detector-word';
import { requireTraceFile } from './find-place';
import { prepareTrace } from './read-trace';
import { keptOf } from './create-trace';
import { requireTrace } from './require-trace';
import type { PointsJson, PointsQuery, ReadOptions, TracePreviewJson } from './schema';
import { readTracePoints } from './trace-points';

/** Points of a trace for a picture of so many pixels: of each pixel the lowest and the highest stay. */
export async function readPoints(actor: Actor, id: string, query: PointsQuery): Promise<PointsJson> {
  const { trace, evidence } = await requireTrace(actor, id);
  const { points } = await readTracePoints(evidence, keptOf(trace).read);
  const shown = decimateTrace(points.timeMin, points.signal, query.pixels, query.from, query.to);
  return {
    timeMin: Array.from(shown.timeMin),
    signal: Array.from(shown.signal),
    pointCount: points.timeMin.length,
    thinned: shown.timeMin.length >= 2 * query.pixels,
  };
}

/** How a file would be read, for a person to confirm; nothing is saved. 422 as for reading it. */
export async function previewTrace(
  actor: Actor,
  evidenceId: string,
  read: ReadOptions,
): Promise<TracePreviewJson> {
  const evidence = await requireTraceFile(requirePerson(actor), evidenceId);
  const { points, detected, found } = prepareTrace(await readTracePoints(evidence, read), read);
  const shown = decimateTrace(points.timeMin, points.signal, 800);
  const startMin = points.timeMin[0] ?? 0;
  return {
    detected,
    detector: detectorNamedIn(evidence.fileName, detected.columns.join(' ')),
    pointCount: points.timeMin.length,
    startMin,
    durationMin: (points.timeMin.at(-1) ?? startMin) - startMin,
    peakCount: found.peaks.length,
    timeMin: Array.from(shown.timeMin),
    signal: Array.from(shown.signal),
  };
}
