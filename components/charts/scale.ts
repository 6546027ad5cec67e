/** A straight line from a domain to pixels. A domain without width maps to the middle of the range. */
export function linearScale(
  domain: readonly [number, number],
  range: readonly [number, number],
): (value: number) => number {
  const [d0, d1] = domain;
  const [r0, r1] = range;
  if (d1 === d0) return () => (r0 + r1) / 2;
  return (value) => r0 + ((value - d0) / (d1 - d0)) * (r1 - r0);
}

/**
 * Round numbers for an axis: multiples of 1, 2 or 5 times a power of ten that lie inside [low, high].
 * `atMost` bounds their number. Returns [low] when both ends are the same.
 */
export function roundTicks(low: number, high: number, atMost: number): number[] {
  if (!(high > low)) return [low];
  const rough = (high - low) / Math.max(1, atMost);
  const power = 10 ** Math.floor(Math.log10(rough));
  const step =
    [1, 2, 5, 10]
      .map((m) => m * power)
      .find((s) => Math.floor(high / s) - Math.ceil(low / s) + 1 <= atMost) ?? 10 * power;
  const ticks: number[] = [];
  for (let n = Math.ceil(low / step - 1e-9); n * step <= high + step * 1e-9; n += 1)
    ticks.push(Number((n * step).toPrecision(12)));
  return ticks;
}

/** How many decimals the labels of these ticks need to differ from each other, 0 to 6. */
export function tickDecimals(ticks: readonly number[]): number {
  const step = ticks.length > 1 ? Math.abs(ticks[1]! - ticks[0]!) : 1;
  return Math.min(6, Math.max(0, -Math.floor(Math.log10(step) + 1e-9)));
}
