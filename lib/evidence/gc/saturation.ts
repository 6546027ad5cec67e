/**
 * Whether a peak's top is cut flat by the detector or converter: at least four equal points in a row at the highest
 * value of the whole trace, over at least 15 % of the width at half height. `quantisationStep` keeps a peak of
 * a few converter steps from being taken for a saturated one. Returns the plateau or null.
 */
export function findPlateau(
  signal: Float64Array,
  top: number,
  traceMaximum: number,
  traceRange: number,
  widthHalfPoints: number | null,
  height: number,
  quantisationStep: number | null,
): { from: number; to: number } | null {
  const tolerance = 1e-9 * traceRange;
  if (!(signal[top]! >= traceMaximum - tolerance)) return null;
  if (quantisationStep !== null && height < 20 * quantisationStep) return null;
  let from = top;
  let to = top;
  while (from > 0 && Math.abs(signal[from - 1]! - traceMaximum) <= tolerance) from--;
  while (to + 1 < signal.length && Math.abs(signal[to + 1]! - traceMaximum) <= tolerance) to++;
  const run = to - from + 1;
  if (run < 4 || (widthHalfPoints !== null && run < 0.15 * widthHalfPoints)) return null;
  return { from, to };
}
