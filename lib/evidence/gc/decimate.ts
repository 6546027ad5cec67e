/**
 * Thins a trace for a plot of so many pixels: of each pixel's points the lowest and the highest stay, in the order of
 * time, and so do the first and the last point. No extreme of the trace is ever lost. A trace that is short enough is
 * returned whole. `from` and `to` limit the range (min, inclusive).
 */
export function decimateTrace(
  timeMin: Float64Array,
  signal: Float64Array,
  pixels: number,
  from = -Infinity,
  to = Infinity,
): { timeMin: Float64Array; signal: Float64Array } {
  let first = 0;
  let end = timeMin.length;
  while (first < end && timeMin[first]! < from) first++;
  while (end > first && timeMin[end - 1]! > to) end--;
  const count = end - first;
  const columns = Math.max(1, Math.floor(pixels));
  if (count <= 2 * columns + 2)
    return { timeMin: timeMin.slice(first, end), signal: signal.slice(first, end) };

  const kept = new Float64Array(2 * columns + 2);
  let size = 0;
  const keep = (index: number) => {
    if (size === 0 || kept[size - 1]! < index) kept[size++] = index;
  };
  keep(first);
  for (let column = 0; column < columns; column++) {
    const a = first + Math.floor((column * count) / columns);
    const b = first + Math.floor(((column + 1) * count) / columns);
    let low = a;
    let high = a;
    for (let i = a + 1; i < b; i++) {
      if (signal[i]! < signal[low]!) low = i;
      if (signal[i]! > signal[high]!) high = i;
    }
    keep(Math.min(low, high));
    keep(Math.max(low, high));
  }
  keep(end - 1);
  return {
    timeMin: Float64Array.from({ length: size }, (_, k) => timeMin[kept[k]!]!),
    signal: Float64Array.from({ length: size }, (_, k) => signal[kept[k]!]!),
  };
}
