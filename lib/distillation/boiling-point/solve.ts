/**
 * Root of an increasing function by bisection. The callers bracket the root; a bracket that holds none is a
 * RangeError, so that no caller mistakes an end of the bracket for an answer.
 */
export function solveIncreasing(f: (x: number) => number, low: number, high: number): number {
  if (!(f(low) <= 0) || !(f(high) >= 0)) throw new RangeError('No solution between the given limits.');
  let from = low;
  let to = high;
  for (let step = 0; step < 80 && to - from > 1e-11 * Math.max(1, Math.abs(to)); step += 1) {
    const middle = (from + to) / 2;
    if (f(middle) < 0) from = middle;
    else to = middle;
  }
  return (from + to) / 2;
}

/** Straight line between the nodes (ascending x), the end values beyond them. */
export function interpolate(xs: readonly number[], ys: readonly number[], x: number): number {
  if (x <= xs[0]!) return ys[0]!;
  for (let i = 1; i < xs.length; i += 1) {
    if (x <= xs[i]!) {
      const share = (x - xs[i - 1]!) / (xs[i]! - xs[i - 1]!);
      return ys[i - 1]! + share * (ys[i]! - ys[i - 1]!);
    }
  }
  return ys[ys.length - 1]!;
}
