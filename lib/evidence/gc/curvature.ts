/**
 * Second difference at point i by least squares of a parabola through five points (Savitzky & Golay,
 * Anal. Chem. 36 (1964) 1627, table for the second derivative, n = 5). Negative on a peak's top;
 * zero on any straight drift; positive on a peak's tail.
 */
export function curvatureAt(points: Float64Array, i: number): number {
  return (2 * (points[i - 2]! + points[i + 2]!) - points[i - 1]! - points[i + 1]! - 2 * points[i]!) / 7;
}

/** White noise of standard deviation 1 gives curvature of this standard deviation: sqrt(14)/7. */
export const curvatureNoiseGain = Math.sqrt(14) / 7;
