import { parseQuantity, type Parsed } from './quantity-text';
import { requireFinite } from './require-number';

export type TemperatureUnit = '°C' | 'K' | '°F';

/** 0 °C in kelvin, by definition of the Celsius scale. */
export const ZERO_CELSIUS_K = 273.15;

const SPELLINGS: Readonly<Record<string, TemperatureUnit>> = {
  '°c': '°C',
  c: '°C',
  degc: '°C',
  k: 'K',
  '°f': '°F',
  f: '°F',
  degf: '°F',
};

/** Degrees Celsius to kelvin. Throws a RangeError below absolute zero. */
export function kelvinFromCelsius(temperatureC: number): number {
  const kelvin = requireFinite('Temperature (°C)', temperatureC) + ZERO_CELSIUS_K;
  if (kelvin < 0) throw new RangeError(`${temperatureC} °C is below absolute zero.`);
  return kelvin;
}

/** Kelvin to degrees Celsius. Throws a RangeError below absolute zero. */
export function celsiusFromKelvin(temperatureK: number): number {
  if (requireFinite('Temperature (K)', temperatureK) < 0) {
    throw new RangeError(`${temperatureK} K is below absolute zero.`);
  }
  return temperatureK - ZERO_CELSIUS_K;
}

/** A temperature in any of the units to °C. Throws a RangeError below absolute zero. */
export function temperatureToC(value: number, unit: TemperatureUnit): number {
  requireFinite(`Temperature (${unit})`, value);
  if (unit === 'K') return celsiusFromKelvin(value);
  const celsius = unit === '°C' ? value : ((value - 32) * 5) / 9;
  kelvinFromCelsius(celsius);
  return celsius;
}

/** °C to any of the units. Throws a RangeError below absolute zero. */
export function temperatureFromC(temperatureC: number, unit: TemperatureUnit): number {
  const kelvin = kelvinFromCelsius(temperatureC);
  if (unit === 'K') return kelvin;
  return unit === '°C' ? temperatureC : (temperatureC * 9) / 5 + 32;
}

/** Reads "23,5", "296.6 K" or "74 °F"; the value comes back in °C. No unit means °C. */
export function parseTemperatureC(text: string, fallback: TemperatureUnit = '°C'): Parsed<'°C'> {
  const parsed = parseQuantity(text, SPELLINGS, fallback, '23.5 °C');
  if (!parsed.ok) return parsed;
  try {
    return { ok: true, value: temperatureToC(parsed.value, parsed.unit), unit: '°C' };
  } catch {
    return { ok: false, problem: `${parsed.value} ${parsed.unit} is below absolute zero: check the sign.` };
  }
}

/** "23.5 °C": one decimal unless told otherwise, a true minus sign. */
export function formatTemperature(temperatureC: number, unit: TemperatureUnit = '°C', decimals = 1): string {
  const shown = temperatureFromC(temperatureC, unit).toFixed(decimals);
  const text = Number(shown) === 0 ? (0).toFixed(decimals) : shown;
  return `${text.replace('-', '\u2212')} ${unit}`;
}
