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

/** Points from the top to three quarters of its height (0.76 standard deviations of a Gaussian), on the steeper side. */
function distanceToThreeQuarters(
  running: RunningSum,
  highest: number,
  height: number,
  furthest: number,
  width: number,
): number {
  for (let d = 1; d < furthest; d++) {
    const left = meanOf(running, highest - d - width, highest - d + width + 1);
    const right = meanOf(running, highest + d - width, highest + d + width + 1);
    if (Math.min(left, right) <= 0.75 * height) return d;
  }
  return furthest;
}

/** Finds the top of a candidate within its concave stretch, by short means so that noise does not decide. */
export function findTop(corrected: Float64Array, running: RunningSum, candidate: Candidate): Top {
  const half = inflectionDistance(candidate);
  const width = Math.max(0, Math.floor(half / 8));
  const step = Math.max(1, Math.floor(half / 24));
  const first = Math.max(0, candidate.from - 1);
  const last = Math.min(corrected.length - 1, candidate.to + 1);
  const meanAt = (i: number) => meanOf(running, i - width, i + width + 1);
  const apart = Math.max(step, Math.round(half / 2));
  let highest = -1;
  let best = -Infinity;
  for (let i = first + step; i <= last - step; i += step) {
    const mean = meanAt(i);
    if (mean <= best) continue;
    // A maximum of its own: on a tail the edge of the stretch can be higher.
    if (mean < meanAt(i - step) || mean < meanAt(i + step)) continue;
    if (mean <= meanAt(Math.max(0, i - apart)) || mean <= meanAt(Math.min(corrected.length - 1, i + apart)))
      continue;
    best = mean;
    highest = i;
  }
  if (highest < 0) {
    const at = candidate.apex;
    return { candidate, half, highest: at, apexIndex: at, height: meanAt(at), hasMaximum: false };
  }
  const reach = Math.round(0.4 * distanceToThreeQuarters(running, highest, best, Math.ceil(half), width));
  const apex = parabolaApex(corrected, highest, Math.max(1, reach));
  return { candidate, half, highest, apexIndex: apex.index, height: apex.height, hasMaximum: true };
}
