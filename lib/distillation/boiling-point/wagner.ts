import { requirePositive } from '@/lib/units/require-number';
import { celsiusFromKelvin, kelvinFromCelsius } from '@/lib/units/temperature';
import { solveIncreasing } from './solve';
import type { WagnerSet } from './vapour-pressure-data';

/**
 * Below 0.4 Tc the fitted data end for most liquids and the powers of t run away, so nothing is computed there.
 * (The 2.5-5 form is fitted from about 0.5 Tc, or the triple point, to Tc; the limit here is common practice.)
 */
const LOWEST_REDUCED_TEMPERATURE = 0.4;

/** Temperatures over which the set is used, °C. */
export function wagnerRangeC(set: WagnerSet): { lowC: number; highC: number } {
  return {
    lowC: celsiusFromKelvin(
      LOWEST_REDUCED_TEMPERATURE * requirePositive('Critical temperature (K)', set.tcK),
    ),
    highC: celsiusFromKelvin(set.tcK),
  };
}

/**
 * Vapour pressure in kPa from Wagner coefficients (2.5-5 form: VDI Heat Atlas, part D3; Wagner 1973).
 * Throws a RangeError outside 0.4 Tc .. Tc.
 */
export function wagnerPressureKPa(set: WagnerSet, temperatureC: number): number {
  const temperatureK = kelvinFromCelsius(temperatureC);
  const { lowC, highC } = wagnerRangeC(set);
  if (temperatureC < lowC - 1e-9 || temperatureC > highC) {
    throw new RangeError(
      `${temperatureC.toFixed(1)} °C is outside ${lowC.toFixed(0)} to ${highC.toFixed(0)} °C, where the Wagner coefficients hold.`,
    );
  }
  const t = Math.max(0, 1 - temperatureK / set.tcK);
  const sum = set.a * t + set.b * t ** 1.5 + set.c * t ** 2.5 + set.d * t ** 5;
  return requirePositive('Critical pressure (kPa)', set.pcKPa) * Math.exp((sum * set.tcK) / temperatureK);
}

/** Boiling point in °C at a pressure in kPa. Throws a RangeError outside the pressures that the set covers. */
export function wagnerBoilingPointC(set: WagnerSet, pressureKPa: number): number {
  requirePositive('Pressure (kPa)', pressureKPa);
  const { lowC, highC } = wagnerRangeC(set);
  const logPressure = Math.log(pressureKPa);
  if (pressureKPa > set.pcKPa || pressureKPa < wagnerPressureKPa(set, lowC)) {
    throw new RangeError(`${pressureKPa} kPa is outside the pressures that the Wagner coefficients cover.`);
  }
  return solveIncreasing((c) => Math.log(wagnerPressureKPa(set, c)) - logPressure, lowC, highC);
}
