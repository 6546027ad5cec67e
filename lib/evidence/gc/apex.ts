/**
 * Top of a peak by a parabola fitted through the points within `reach` of the highest one (least squares; three
 * points give the parabola exactly). Index is fractional. A flat or upward-open fit keeps the highest point.
 */
export function parabolaApex(
  points: Float64Array,
  highest: number,
  reach: number,
): { index: number; height: number } {
  const r = Math.max(1, Math.min(reach, highest, points.length - 1 - highest));
  if (highest - r < 0 || highest + r >= points.length)
    return { index: highest, height: points[highest] ?? Number.NaN };
  let s2 = 0;
  let s4 = 0;
  let y0 = 0;
  let y1 = 0;
  let y2 = 0;
  for (let k = -r; k <= r; k++) {
    const y = points[highest + k]!;
    s2 += k * k;
    s4 += k * k * k * k;
    y0 += y;
    y1 += k * y;
    y2 += k * k * y;
  }
  const count = 2 * r + 1;
  const quadratic = (count * y2 - s2 * y0) / (count * s4 - s2 * s2);
  const linear = y1 / s2;
  const constant = (y0 - quadratic * s2) / count;
  if (!(quadratic < 0)) return { index: highest, height: points[highest]! };
  const shift = -linear / (2 * quadratic);
  if (Math.abs(shift) > r) return { index: highest, height: points[highest]! };
  return { index: highest + shift, height: constant + 0.5 * linear * shift };
}
