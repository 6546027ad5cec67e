import { requireFinite, requirePositive, requireWithin } from '@/lib/units/require-number';

export const INDEX_METHOD_VERSION = 'refractive-index-1';

/** Fall of the refractive index of an organic liquid with temperature, per °C (common practice). */
export const USUAL_INDEX_FALL_PER_C = 4.5e-4;
/** Standard uncertainty of that coefficient where the compound has none of its own, per °C (common practice). */
export const USUAL_INDEX_FALL_UNCERTAINTY_PER_C = 0.5e-4;

/** The sodium D line, nm, and how far a light source may lie from it to be compared with D-line literature. */
export const SODIUM_D_NM = 589.3;
const SODIUM_D_TOLERANCE_NM = 0.5;

/** A refractive index of a liquid: throws a RangeError outside 1.2 to 1.9, where a reading is a slip. */
export function requireIndex(name: string, n: number): number {
  return requireWithin(name, n, 1.2, 1.9);
}

/**
 * Refractive index carried from the temperature of the measurement to another:
 * n(to) = n + k (T_measured - T_to), k the fall per °C, above zero. Carry a measurement to the temperature of the
 * literature value it will be compared with, not always to 20 °C.
 *
 * @throws RangeError for an index outside 1.2 to 1.9, a coefficient that is not above zero, or temperatures
 *   outside -50 to 150 °C
 */
export function correctIndex(input: {
  n: number;
  temperatureC: number;
  toTemperatureC: number;
  fallPerC?: number;
}): number {
  const fall = requirePositive('Fall of the index per °C', input.fallPerC ?? USUAL_INDEX_FALL_PER_C);
  requireWithin('Temperature of the reading (°C)', input.temperatureC, -50, 150);
  requireWithin('Temperature to correct to (°C)', input.toTemperatureC, -50, 150);
  return requireIndex('Refractive index', input.n) + fall * (input.temperatureC - input.toTemperatureC);
}

/** Whether a reading at this wavelength (nm) can be compared with values for the sodium D line. */
export function isSodiumD(wavelengthNm: number): boolean {
  return Math.abs(requireFinite('Wavelength (nm)', wavelengthNm) - SODIUM_D_NM) <= SODIUM_D_TOLERANCE_NM;
}
