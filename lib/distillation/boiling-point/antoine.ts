import { requireFinite, requirePositive } from '@/lib/units/require-number';
import type { AntoineSet } from './vapour-pressure-data';

/** How far beyond its fitted range a set may be used, °C. Further out Antoine bends away from the truth. */
export const ANTOINE_EXTRAPOLATION_C = 5;

export type AntoineReach = 'inside' | 'extrapolated' | 'outside';

/** Whether a temperature lies in the set's range, up to 5 °C beyond it, or outside. */
export function antoineReach(set: AntoineSet, temperatureC: number): AntoineReach {
  requireFinite('Temperature (°C)', temperatureC);
  if (set.tMinC > set.tMaxC) throw new RangeError('The Antoine range has its limits swapped.');
  if (temperatureC >= set.tMinC && temperatureC <= set.tMaxC) return 'inside';
  const beyond = Math.max(set.tMinC - temperatureC, temperatureC - set.tMaxC);
  return beyond <= ANTOINE_EXTRAPOLATION_C ? 'extrapolated' : 'outside';
}

/** Vapour pressure in kPa: log10(P/kPa) = a - b/(t + c). Does not look at the range: see antoineReach. */
export function antoinePressureKPa(set: AntoineSet, temperatureC: number): number {
  requireFinite('Temperature (°C)', temperatureC);
  const denominator = temperatureC + set.c;
  if (denominator <= 0) throw new RangeError(`${temperatureC} °C is below the pole of the Antoine equation.`);
  return 10 ** (set.a - set.b / denominator);
}

/** Boiling point in °C at a pressure in kPa. Does not look at the range: see antoineReach. */
export function antoineBoilingPointC(set: AntoineSet, pressureKPa: number): number {
  const remainder = set.a - Math.log10(requirePositive('Pressure (kPa)', pressureKPa));
  if (remainder <= 0)
    throw new RangeError(`${pressureKPa} kPa is above what the Antoine equation can reach.`);
  return set.b / remainder - set.c;
}
