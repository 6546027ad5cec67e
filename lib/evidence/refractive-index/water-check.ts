import { requireWithin } from '@/lib/units/require-number';
import { requireIndex } from './correct-index';

/** Offset from which the instrument is to be adjusted, and from which its readings prove nothing. */
export const WATER_WARNING_OFFSET = 0.0002;
export const WATER_INCONCLUSIVE_OFFSET = 0.0005;

/** Absorbs the binary rounding of four-decimal readings, nothing more. */
const ROUNDING = 1e-9;

/**
 * Refractive index of water for the sodium D line: 1.3330 at 20 °C, 1.3325 at 25 °C (Ph. Eur. 2.2.6; USP <831>),
 * by a straight line between and as far as 15 and 30 °C, where it is within 0.0002 of the tables.
 *
 * @throws RangeError outside 15 to 30 °C: check the instrument near room temperature
 */
export function waterIndex(temperatureC: number): number {
  requireWithin('Temperature of the water (°C)', temperatureC, 15, 30);
  return 1.333 - 0.0001 * (temperatureC - 20);
}

export type WaterCheck = {
  state: 'good' | 'warning' | 'inconclusive';
  expected: number;
  /** Reading minus expected. */
  offset: number;
  reason: string;
};

/** Checks the instrument with a reading of pure water. Throws a RangeError for a reading that is no index. */
export function checkWater(input: { reading: number; temperatureC: number }): WaterCheck {
  const expected = waterIndex(input.temperatureC);
  const offset = requireIndex('Water reading', input.reading) - expected;
  const size = Math.abs(offset);
  const said = `Water reads ${input.reading.toFixed(4)} for ${expected.toFixed(4)} at ${input.temperatureC.toFixed(1)} °C`;
  if (size > WATER_INCONCLUSIVE_OFFSET + ROUNDING) {
    const reason = `${said}: off by more than ${WATER_INCONCLUSIVE_OFFSET}. Clean and adjust the refractometer, then read again.`;
    return { state: 'inconclusive', expected, offset, reason };
  }
  if (size > WATER_WARNING_OFFSET + ROUNDING) {
    const reason = `${said}: off by more than ${WATER_WARNING_OFFSET}. Clean the prism and adjust soon.`;
    return { state: 'warning', expected, offset, reason };
  }
  return { state: 'good', expected, offset, reason: `${said}: within ${WATER_WARNING_OFFSET}.` };
}
