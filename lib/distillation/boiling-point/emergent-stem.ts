import { requireFinite, requireWithin } from '@/lib/units/require-number';

/** Apparent expansion of mercury in glass, per °C (common practice for ordinary thermometer glass). */
export const MERCURY_IN_GLASS_PER_C = 0.00016;

/**
 * What to add to a mercury thermometer's reading for the thread outside the vapour, in °C:
 * 0.00016 N (t - t_stem), N the length of that thread in degrees of the scale.
 *
 * @throws RangeError when a number is missing or N is negative or over 500
 */
export function emergentStemCorrectionC(input: {
  emergentThreadC: number;
  readingC: number;
  stemTemperatureC: number;
}): number {
  requireWithin('Emergent thread (degrees of the scale)', input.emergentThreadC, 0, 500);
  requireFinite('Thermometer reading (°C)', input.readingC);
  requireFinite('Stem temperature (°C)', input.stemTemperatureC);
  return MERCURY_IN_GLASS_PER_C * input.emergentThreadC * (input.readingC - input.stemTemperatureC);
}
