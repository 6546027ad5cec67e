import { EvidenceFile, Trace } from '@/lib/database/records';
import { log } from '@/lib/log';
import { keptOf } from './create-trace';
import { decimateTrace } from './decimate';
import { readTracePoints } from './trace-points';

/** The signal of a trace, thinned for a small picture: time in min, signal in the file's own unit. */
export type TracePicture = { timeMin: number[]; signal: number[] };

/**
 * Pictures by the trace's id, for a sheet whose reader was found to be allowed to see these traces. A trace whose file
 * cannot be read at the moment is left out: a missing picture must not take the sheet away.
 */
export async function listTracePictures(
  traceIds: readonly string[],
  pixels: number,
): Promise<Record<string, TracePicture>> {
  const traces = await Trace.findAll({ where: { id: [...traceIds] } });
  const files = await EvidenceFile.findAll({ where: { id: traces.map((trace) => trace.evidenceId) } });
  const pictures: Record<string, TracePicture> = {};
  // One after the other: a long trace takes much memory while it is parsed.
  for (const trace of traces) {
    const file = files.find((each) => each.id === trace.evidenceId);
    if (!file) continue;
    try {
      const { points } = await readTracePoints(file, keptOf(trace).read);
      const shown = decimateTrace(points.timeMin, points.signal, pixels);
      pictures[trace.id] = { timeMin: Array.from(shown.timeMin), signal: Array.from(shown.signal) };
    } catch (error) {
      log().warn({ err: error, traceId: trace.id }, 'a trace could not be read for its picture');
    }
  }
  return pictures;
}
