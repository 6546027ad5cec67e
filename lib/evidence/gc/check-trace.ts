import { TraceProblem } from './integration';

/**
 * Refuses a trace whose points cannot be integrated: another number of times than of signals, a value that
 * is no finite number, times that do not rise. Says at which point.
 *
 * @throws TraceProblem
 */
export function checkTrace(timeMin: Float64Array, signal: Float64Array): void {
  if (timeMin.length !== signal.length) {
    throw new TraceProblem(
      `The trace has ${timeMin.length} times and ${signal.length} signal values; choose columns of equal length.`,
    );
  }
  let before = -Infinity;
  for (let i = 0; i < signal.length; i++) {
    const t = timeMin[i]!;
    // value - value is 0 for every finite number and NaN for NaN and both infinities.
    if (signal[i]! - signal[i]! !== 0 || t - t !== 0) {
      throw new TraceProblem(
        `Point ${i + 1} is not a finite number; export the trace again or cut that point out.`,
        i,
      );
    }
    if (t <= before) {
      throw new TraceProblem(
        `The time at point ${i + 1} (${t} min) is not later than the one before it; sort the points by time.`,
        i,
      );
    }
    before = t;
  }
}

/** Longest step of time over the median step; 1 for even sampling. Looks at no more than 20,000 steps. */
export function samplingUnevenness(timeMin: Float64Array): number {
  if (timeMin.length < 3) return 1;
  const stride = Math.max(1, Math.floor((timeMin.length - 1) / 20_000));
  const steps: number[] = [];
  for (let i = 1; i < timeMin.length; i += stride) steps.push(timeMin[i]! - timeMin[i - 1]!);
  const sorted = Float64Array.from(steps).sort();
  return sorted[sorted.length - 1]! / sorted[sorted.length >> 1]!;
}
