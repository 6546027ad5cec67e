import type { PointsJson } from '@/lib/evidence/gc/schema';

/** The whole trace in coarse points with the finer ones in the part that is looked at. */
export function mergePoints(
  whole: Pick<PointsJson, 'timeMin' | 'signal'>,
  part: Pick<PointsJson, 'timeMin' | 'signal'> | undefined,
): { timeMin: number[]; signal: number[] } {
  const first = part?.timeMin[0];
  const last = part?.timeMin.at(-1);
  if (!part || first === undefined || last === undefined) return whole;
  const before = whole.timeMin.findIndex((time) => time >= first);
  const after = whole.timeMin.findIndex((time) => time > last);
  const [head, tail] = [before < 0 ? whole.timeMin.length : before, after < 0 ? whole.timeMin.length : after];
  return {
    timeMin: [...whole.timeMin.slice(0, head), ...part.timeMin, ...whole.timeMin.slice(tail)],
    signal: [...whole.signal.slice(0, head), ...part.signal, ...whole.signal.slice(tail)],
  };
}
