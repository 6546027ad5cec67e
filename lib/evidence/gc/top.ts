import { parabolaApex } from './apex';
import { inflectionDistance } from './bounds';
import type { Candidate } from './detect-peaks';
import { meanOf, type RunningSum } from './running-sum';

/** A candidate with its top, above the baseline. */
export interface Top {
  candidate: Candidate;
  half: number;
  /** Highest point (whole index) and apex (fractional). */
  highest: number;
  apexIndex: number;
  height: number;
  /** False for a shoulder: the trace only rises or only falls through it. */
  hasMaximum: boolean;
}

/** Finds the top of a candidate within its concave stretch, by short means so that noise does not decide. */
export function findTop(corrected: Float64Array, running: RunningSum, candidate: Candidate): Top {
  const half = inflectionDistance(candidate);
  const width = Math.max(0, Math.floor(half / 6));
  const step = Math.max(1, Math.floor(half / 24));
  const first = Math.max(0, candidate.from - 1);
  const last = Math.min(corrected.length - 1, candidate.to + 1);
  let highest = first;
  let best = -Infinity;
  for (let i = first; i <= last; i += step) {
    const mean = meanOf(running, i - width, i + width + 1);
    if (mean > best) {
      best = mean;
      highest = i;
    }
  }
  const hasMaximum = highest > first && highest < last - step + 1;
  if (!hasMaximum) {
    const at = candidate.apex;
    return { candidate, half, highest: at, apexIndex: at, height: corrected[at]!, hasMaximum };
  }
  const apex = parabolaApex(corrected, highest, Math.max(1, Math.round(0.35 * half)));
  return { candidate, half, highest, apexIndex: apex.index, height: apex.height, hasMaximum };
}
