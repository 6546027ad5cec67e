/**
 * The baseline at each point of a trace: straight lines between its corners, level beyond the first and the last. Null
 * where there is no baseline. Times ascend; both in min. For drawing only: areas were computed on every point.
 */
export function baselineAt(
  corners: { timeMin: readonly number[]; signal: readonly number[] },
  timeMin: readonly number[],
): (number | null)[] {
  const { timeMin: at, signal } = corners;
  let next = 0;
  return timeMin.map((time) => {
    if (at.length === 0) return null;
    while (next < at.length && at[next]! < time) next += 1;
    if (next === 0) return signal[0]!;
    if (next === at.length) return signal[at.length - 1]!;
    const share = (time - at[next - 1]!) / (at[next]! - at[next - 1]!);
    return signal[next - 1]! + share * (signal[next]! - signal[next - 1]!);
  });
}
