/**
 * Area of points from..to (both included) above zero level, by trapezoids, signal x min.
 */
export function trapezoidArea(
  timeMin: Float64Array,
  corrected: (index: number) => number,
  from: number,
  to: number,
): number {
  let area = 0;
  let before = corrected(from);
  for (let i = from + 1; i <= to; i++) {
    const value = corrected(i);
    area += 0.5 * (before + value) * (timeMin[i]! - timeMin[i - 1]!);
    before = value;
  }
  return area;
}

/** Resolution of two neighbours from their widths at half height: Rs = 1.18 (t2 - t1)/(w1 + w2). USP <621>, Ph. Eur. 2.2.46. */
export function resolution(
  earlier: { retentionTimeMin: number; widthHalfMin: number },
  later: { retentionTimeMin: number; widthHalfMin: number },
): number {
  return (
    (1.18 * (later.retentionTimeMin - earlier.retentionTimeMin)) / (earlier.widthHalfMin + later.widthHalfMin)
  );
}

/** Number of theoretical plates from the width at half height: N = 5.54 (t/w)^2. USP <621>, Ph. Eur. 2.2.46. */
export function plateNumber(retentionTimeMin: number, widthHalfMin: number): number {
  return 5.54 * (retentionTimeMin / widthHalfMin) ** 2;
}

/**
 * Symmetry factor (tailing): As = w0.05/(2d), with the width at 1/20 of the height and the distance d from its front
 * edge to the perpendicular through the apex. Over 1: tailing. USP <621>, Ph. Eur. 2.2.46.
 */
export function symmetryFactor(widthTwentiethMin: number, frontTwentiethMin: number): number {
  return widthTwentiethMin / (2 * frontTwentiethMin);
}

/** S/N = 2H/h: height of the peak, peak-to-peak noise. USP <621>, Ph. Eur. 2.2.46. */
export function signalToNoise(height: number, peakToPeakNoise: number): number {
  return (2 * height) / peakToPeakNoise;
}

/**
 * Fractional index at which the trace, going from the apex in the direction, first falls to the level; straight line between
 * points. Null when it does not before the limit.
 */
export function crossing(
  value: (index: number) => number,
  apex: number,
  direction: -1 | 1,
  limit: number,
  level: number,
): number | null {
  let before = value(apex);
  for (let i = apex + direction; direction > 0 ? i <= limit : i >= limit; i += direction) {
    const here = value(i);
    if (here <= level) return before === here ? i : i - direction * ((level - here) / (before - here));
    before = here;
  }
  return null;
}

/** Time at a fractional point index. */
export function timeAt(timeMin: Float64Array, index: number): number {
  const i = Math.min(timeMin.length - 2, Math.max(0, Math.floor(index)));
  if (timeMin.length < 2) return timeMin[0] ?? Number.NaN;
  return timeMin[i]! + (index - i) * (timeMin[i + 1]! - timeMin[i]!);
}
