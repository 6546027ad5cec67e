import { formatPressure } from '@/lib/units/pressure';
import { requireFinite, requireNotNegative, requirePositive } from '@/lib/units/require-number';
import { METHOD_NAMES, type BoilingPointMethod } from './boiling-point/boiling-point-at-pressure';

export const BOILING_RANGE_METHOD_VERSION = 'boiling-range-1';

export type BoilingRangeInput = {
  /** Head temperature at the start and the end of the cut, °C, after any stem correction. */
  headTemperatureFromC: number;
  headTemperatureToC: number;
  pressureMbar: number;
  /** Boiling point expected at that pressure with its 95 % half-width. */
  expected: { boilingPointC: number; uncertaintyC: number; method: BoilingPointMethod };
  /** Allowed distance from the expected boiling point, °C. */
  toleranceC: number;
  /** Allowed width of the cut, °C; not judged without one. */
  maximumWidthC?: number;
  /** 95 % half-width of the thermometer, °C. Default 0.5 (common practice). */
  thermometerUncertaintyC?: number;
  /** 95 % half-width that the manometer puts on the boiling point, °C. Default 0. */
  pressureUncertaintyC?: number;
};

export type BoilingRangeResult = {
  state: 'pass' | 'fail' | 'inconclusive';
  lowC: number;
  highC: number;
  widthC: number;
  expectedC: number;
  /** Of the end of the cut that lies further from the expected boiling point; above zero when hotter. */
  distanceC: number;
  /** Root of the summed squares of method, thermometer and manometer, 95 %. */
  uncertaintyC: number;
  /** Tolerance and uncertainty together: sqrt(tolerance^2 + uncertainty^2). */
  effectiveToleranceC: number;
  sank: boolean;
  reason: string;
  notes: string[];
};

/**
 * Compares the head temperatures of a cut with the boiling point expected at its pressure.
 *
 * - fail: an end lies further away than tolerance + uncertainty, or the cut is wider than allowed;
 * - inconclusive: the uncertainty is larger than the tolerance, or the end lies between the two limits;
 * - pass: both ends within sqrt(tolerance^2 + uncertainty^2), with an uncertainty no larger than the tolerance.
 *
 * A head temperature that sinks over the cut means too little vapour, not a new compound (common practice): then
 * only the start is judged, and neither the end nor the width. Throws a RangeError for numbers that are none.
 */
export function judgeBoilingRange(input: BoilingRangeInput): BoilingRangeResult {
  const from = requireFinite('Head temperature at the start (°C)', input.headTemperatureFromC);
  const to = requireFinite('Head temperature at the end (°C)', input.headTemperatureToC);
  requirePositive('Pressure (mbar)', input.pressureMbar);
  const tolerance = requirePositive('Tolerance (°C)', input.toleranceC);
  const expectedC = requireFinite('Expected boiling point (°C)', input.expected.boilingPointC);
  const uncertaintyC = Math.hypot(
    requireNotNegative('Uncertainty of the boiling point (°C)', input.expected.uncertaintyC),
    requireNotNegative('Uncertainty of the thermometer (°C)', input.thermometerUncertaintyC ?? 0.5),
    requireNotNegative('Uncertainty by the pressure (°C)', input.pressureUncertaintyC ?? 0),
  );
  if (input.maximumWidthC !== undefined) requirePositive('Allowed width (°C)', input.maximumWidthC);

  const sank = to < from;
  const ends = sank ? [from] : [from, to];
  const distanceC = ends.map((t) => t - expectedC).reduce((a, b) => (Math.abs(b) > Math.abs(a) ? b : a));
  const widthC = Math.abs(to - from);
  const effectiveToleranceC = Math.hypot(tolerance, uncertaintyC);
  const tooWide = !sank && input.maximumWidthC !== undefined && widthC > input.maximumWidthC + 1e-9;
  const notes: string[] = [];
  if (sank)
    notes.push(
      'The head temperature sank: too little vapour, not a new compound (common practice). Only the start was judged.',
    );
  if (tooWide && to > expectedC)
    notes.push('A rise over the cut is how the next component shows (common practice).');

  const size = Math.abs(distanceC);
  const where = `${size.toFixed(1)} °C ${distanceC < 0 ? 'below' : 'above'} the ${expectedC.toFixed(1)} °C expected at ${formatPressure(input.pressureMbar)} (${METHOD_NAMES[input.expected.method]}, all errors ±${uncertaintyC.toFixed(1)} °C, tolerance ${tolerance} °C)`;
  const answer = (state: BoilingRangeResult['state'], reason: string): BoilingRangeResult => ({
    state,
    lowC: Math.min(from, to),
    highC: Math.max(from, to),
    widthC,
    expectedC,
    distanceC,
    uncertaintyC,
    effectiveToleranceC,
    sank,
    reason,
    notes,
  });
  if (size > tolerance + uncertaintyC)
    return answer('fail', `The cut reaches ${where}: too far for this compound.`);
  if (tooWide)
    return answer('fail', `The cut is ${widthC.toFixed(1)} °C wide, ${input.maximumWidthC} °C allowed.`);
  if (uncertaintyC > tolerance) {
    return answer(
      'inconclusive',
      `The cut reaches ${where}: the error is larger than the tolerance. Add a measured vapour pressure of the compound, or read pressure and temperature better.`,
    );
  }
  if (size <= effectiveToleranceC) return answer('pass', `The cut reaches ${where}: it fits.`);
  return answer('inconclusive', `The cut reaches ${where}: at the edge, so it decides nothing.`);
}
