/**
 * Signal minus a blank run, which is read at the same times by straight lines between its points. Outside the blank's own
 * time its first or last value is used. Returns a new array.
 */
export function subtractBlank(
  timeMin: Float64Array,
  signal: Float64Array,
  blank: { timeMin: Float64Array; signal: Float64Array },
): Float64Array {
  const result = Float64Array.from(signal);
  const last = blank.timeMin.length - 1;
  if (last < 0) return result;
  let j = 0;
  for (let i = 0; i < result.length; i++) {
    const t = timeMin[i]!;
    while (j < last - 1 && blank.timeMin[j + 1]! <= t) j++;
    const t0 = blank.timeMin[j]!;
    const t1 = blank.timeMin[Math.min(j + 1, last)]!;
    const share = t1 > t0 ? Math.min(1, Math.max(0, (t - t0) / (t1 - t0))) : 0;
    const y0 = blank.signal[j]!;
    result[i]! -= y0 + share * (blank.signal[Math.min(j + 1, last)]! - y0);
  }
  return result;
}
