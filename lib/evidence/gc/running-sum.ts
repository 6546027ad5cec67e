/** Sums from the start, so that the mean of any stretch costs two reads. `offset` keeps the sums small and exact. */
export interface RunningSum {
  sums: Float64Array;
  offset: number;
}

export function buildRunningSum(signal: Float64Array): RunningSum {
  const offset = signal.length > 0 ? signal[0]! : 0;
  const sums = new Float64Array(signal.length + 1);
  let sum = 0;
  for (let i = 0; i < signal.length; i++) {
    sum += signal[i]! - offset;
    sums[i + 1] = sum;
  }
  return { sums, offset };
}

/** Mean of the points from..to (to is not included; both are cut to the trace). */
export function meanOf(running: RunningSum, from: number, to: number): number {
  const a = Math.max(0, from);
  const b = Math.min(running.sums.length - 1, to);
  return b > a ? running.offset + (running.sums[b]! - running.sums[a]!) / (b - a) : Number.NaN;
}
