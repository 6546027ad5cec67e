import type { LiteratureValueJson } from './schema';

/** Refractive indices are published with four places, and a trailing zero is one of them. */
const INDEX_PLACES = 4;

/** The value as it is read: `1.4720`, `77.1 °C`, or the coefficients by name. */
export function literatureValueText({ value, coefficients, unit, property }: LiteratureValueJson): string {
  if (value === null) {
    const named = Object.entries(coefficients ?? {}).map(
      ([name, number]) => `${COEFFICIENT_WORDS[name] ?? name}\u00a0${withMinus(number)}`,
    );
    return `${named.join(', ')} (${unit})`;
  }
  const places = String(value).split('.')[1]?.length ?? 0;
  const number =
    property === 'refractive index' ? value.toFixed(Math.max(places, INDEX_PLACES)) : String(value);
  return unit === '1' ? number : `${withMinus(number)}\u00a0${unit}`;
}

/** With the minus sign of print, which does not break off at the end of a line. */
function withMinus(number: number | string): string {
  return String(number).replace('-', '\u2212');
}

const COEFFICIENT_WORDS: Readonly<Record<string, string>> = {
  criticalTemperatureK: 'Tc (K)',
  criticalPressureKPa: 'Pc (kPa)',
};

/** Under which conditions a value holds: `20 °C, 589.3 nm`; empty where it needs none and has none. */
export function literatureConditionsText({ conditions, uncertainty }: LiteratureValueJson): string {
  const { temperatureC, pressureKPa, wavelengthNm, rangeMinC, rangeMaxC } = conditions;
  const parts = [
    temperatureC === null ? null : `at ${withMinus(temperatureC)}\u00a0°C`,
    pressureKPa === null ? null : `at ${pressureKPa}\u00a0kPa`,
    wavelengthNm === null ? null : `${wavelengthNm}\u00a0nm`,
    rangeMinC === null || rangeMaxC === null
      ? null
      : `${withMinus(rangeMinC)} to ${withMinus(rangeMaxC)}\u00a0°C`,
    uncertainty === null ? null : `± ${uncertainty}`,
  ];
  return parts.filter((part) => part !== null).join(', ');
}
