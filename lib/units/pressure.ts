import { parseQuantity, significant, type Parsed } from './quantity-text';
import { requirePositive } from './require-number';

export type PressureUnit = 'mbar' | 'mmHg' | 'Torr' | 'kPa' | 'hPa' | 'Pa' | 'bar' | 'atm';

/**
 * Pascals in one of each unit. mmHg is the conventional millimetre of mercury (133.322 387 415 Pa) and Torr is
 * 101 325/760 Pa (NIST SP 811, appendix B): they differ by 1.4e-7, which no gauge shows.
 */
const PASCALS: Readonly<Record<PressureUnit, number>> = {
  mbar: 100,
  mmHg: 133.322387415,
  Torr: 101325 / 760,
  kPa: 1000,
  hPa: 100,
  Pa: 1,
  bar: 100000,
  atm: 101325,
};

const SPELLINGS: Readonly<Record<string, PressureUnit>> = {
  mbar: 'mbar',
  millibar: 'mbar',
  mmhg: 'mmHg',
  torr: 'Torr',
  kpa: 'kPa',
  hpa: 'hPa',
  pa: 'Pa',
  bar: 'bar',
  atm: 'atm',
};

/** The standard atmosphere, 101.325 kPa, in mbar. */
export const STANDARD_ATMOSPHERE_MBAR = 1013.25;

/** Converts a pressure above zero between units. Throws a RangeError for zero, negative or not finite values. */
export function convertPressure(value: number, from: PressureUnit, to: PressureUnit): number {
  requirePositive(`Pressure (${from})`, value);
  return from === to ? value : (value * PASCALS[from]) / PASCALS[to];
}

/** Reads "50 mmHg", "5 kPa" or "66,7"; the value comes back in mbar. Without a unit the fallback applies. */
export function parsePressureMbar(text: string, fallback: PressureUnit = 'mbar'): Parsed<'mbar'> {
  const parsed = parseQuantity(text, SPELLINGS, fallback, '50 mmHg');
  if (!parsed.ok) return parsed;
  if (parsed.value <= 0) {
    return {
      ok: false,
      problem:
        'Enter the absolute pressure in the apparatus: it is above zero (a gauge that shows "vacuum" as negative must be converted).',
    };
  }
  return { ok: true, value: convertPressure(parsed.value, parsed.unit, 'mbar'), unit: 'mbar' };
}

/** "66.7 mbar", "50.0 mmHg": three significant figures from 0.001 up, whole numbers from 100 up. */
export function formatPressure(pressureMbar: number, unit: PressureUnit = 'mbar'): string {
  return `${significant(convertPressure(pressureMbar, 'mbar', unit))} ${unit}`;
}
