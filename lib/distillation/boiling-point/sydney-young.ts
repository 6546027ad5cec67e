import { requireFinite, requireWithin } from '@/lib/units/require-number';

/**
 * What to add to a boiling temperature read at a barometer of p mmHg to get it at 760 mmHg, in °C:
 * 0.00012 (760 - p)(273.15 + t), or 0.00010 for liquids that associate (Sydney Young; also in Ph. Eur. 2.2.12 in
 * another form). Good for the swings of a barometer only, so 650 to 800 mmHg.
 *
 * @throws RangeError outside those pressures: use boilingPointAtPressure there
 */
export function barometricCorrectionC(input: {
  temperatureC: number;
  pressureMmHg: number;
  associated: boolean;
}): number {
  const { temperatureC, pressureMmHg, associated } = input;
  requireFinite('Temperature (°C)', temperatureC);
  requireWithin('Barometer (mmHg)', pressureMmHg, 650, 800);
  return (associated ? 0.0001 : 0.00012) * (760 - pressureMmHg) * (273.15 + temperatureC);
}
