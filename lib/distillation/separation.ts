import { requirePositive, requireWithin } from '@/lib/units/require-number';
import { boilingPointAtPressure, type BoilingPointResult } from './boiling-point/boiling-point-at-pressure';
import { pressureForTemperature } from './boiling-point/pressure-for-temperature';
import type { VapourPressureData } from './boiling-point/vapour-pressure-data';

/** Boiling point differences from which simple distillation usually does, °C (common practice: 70 to 80). */
export const SIMPLE_DISTILLATION_FROM_C = 75;
/** Below this difference a column is wanted, °C (common practice: 25 to 30). */
export const COLUMN_BELOW_C = 30;
/** Relative volatility under which distillation is hardly worth it (common practice). */
export const HARDLY_SEPARABLE_ALPHA = 1.05;

export type SeparationAdvice = {
  technique: 'simple' | 'simple or short column' | 'column' | 'hardly by distillation';
  text: string;
  basis: 'common practice';
};

export type Separation =
  | {
      ok: true;
      light: BoilingPointResult;
      heavy: BoilingPointResult;
      differenceC: number;
      /** Temperature at which the vapour pressures were compared. */
      meanTemperatureC: number;
      relativeVolatility: number;
      minimumStages: number;
      advice: SeparationAdvice;
      notes: string[];
    }
  | { ok: false; problem: string };

/**
 * Theoretical stages at total reflux (Fenske 1932): N = ln[(xD/(1-xD))((1-xB)/xB)]/ln(alpha).
 * The still itself counts as one of them.
 *
 * @param lightInDistillate mole fraction of the light component wanted in the distillate, between 0 and 1
 * @param lightInBottoms mole fraction of it left in the still, below that
 * @throws RangeError when a fraction is not between 0 and 1, they are swapped, or alpha is not above 1
 */
export function fenskeStages(input: {
  lightInDistillate: number;
  lightInBottoms: number;
  relativeVolatility: number;
}): number {
  const { lightInDistillate: xD, lightInBottoms: xB, relativeVolatility: alpha } = input;
  for (const [name, x] of [
    ['Light component in the distillate', xD],
    ['Light component in the still', xB],
  ] as const) {
    if (!(x > 0 && x < 1)) throw new RangeError(`${name} must be a fraction between 0 and 1, got ${x}.`);
  }
  if (xD <= xB) throw new RangeError('The distillate must hold more of the light component than the still.');
  if (!(alpha > 1 && Number.isFinite(alpha))) {
    throw new RangeError(
      `Relative volatility must be above 1, got ${alpha}: light and heavy may be swapped.`,
    );
  }
  return Math.log((xD / (1 - xD)) * ((1 - xB) / xB)) / Math.log(alpha);
}

/** What the boiling points suggest (common practice). Throws a RangeError for a negative difference. */
export function adviseSeparation(differenceC: number, relativeVolatility: number): SeparationAdvice {
  requireWithin('Difference of the boiling points (°C)', differenceC, 0, 1000);
  requirePositive('Relative volatility', relativeVolatility);
  const gap = `The boiling points lie ${differenceC.toFixed(0)} °C apart`;
  if (relativeVolatility < HARDLY_SEPARABLE_ALPHA) {
    const text = `${gap} and the vapour pressures are almost equal: distillation will hardly part them, look for another way.`;
    return { technique: 'hardly by distillation', text, basis: 'common practice' };
  }
  if (differenceC >= SIMPLE_DISTILLATION_FROM_C) {
    return {
      technique: 'simple',
      text: `${gap}: a simple distillation is usually enough.`,
      basis: 'common practice',
    };
  }
  if (differenceC < COLUMN_BELOW_C) {
    return { technique: 'column', text: `${gap}: use a fractionating column.`, basis: 'common practice' };
  }
  const text = `${gap}: a simple distillation leaves some of each in the other; a short column or a second distillation is better.`;
  return { technique: 'simple or short column', text, basis: 'common practice' };
}

/**
 * Plans the separation of two liquids at a pressure: boiling points, relative volatility (ratio of the vapour
 * pressures at the mean of the two, ideal mixture), stages at total reflux, and advice.
 *
 * @param lightPurity mole fraction of the light liquid wanted in the distillate; default 0.95
 * @param heavyPurity mole fraction of the heavy liquid wanted in the still; default 0.95
 * @returns a problem where light and heavy are swapped or boil together
 * @throws RangeError for a pressure out of range or purities that are not between 0.5 and 1
 */
export function planSeparation(input: {
  light: VapourPressureData;
  heavy: VapourPressureData;
  pressureMbar: number;
  lightPurity?: number;
  heavyPurity?: number;
}): Separation {
  const lightPurity = requireWithin('Purity of the light liquid', input.lightPurity ?? 0.95, 0.5, 1 - 1e-9);
  const heavyPurity = requireWithin('Purity of the heavy liquid', input.heavyPurity ?? 0.95, 0.5, 1 - 1e-9);
  if (lightPurity + heavyPurity <= 1 + 1e-12) {
    return {
      ok: false,
      problem: 'Purities of one half each ask for no separation: enter what is wanted, for example 0.95.',
    };
  }
  const light = boilingPointAtPressure(input.light, input.pressureMbar);
  const heavy = boilingPointAtPressure(input.heavy, input.pressureMbar);
  const differenceC = heavy.boilingPointC - light.boilingPointC;
  if (differenceC < 0) {
    return {
      ok: false,
      problem: `At this pressure ${input.light.name} boils above ${input.heavy.name}: swap the light and the heavy compound.`,
    };
  }
  const meanTemperatureC = (light.boilingPointC + heavy.boilingPointC) / 2;
  const lightPressure = pressureForTemperature(input.light, meanTemperatureC);
  const heavyPressure = pressureForTemperature(input.heavy, meanTemperatureC);
  if (!lightPressure.ok) return lightPressure;
  if (!heavyPressure.ok) return heavyPressure;
  const relativeVolatility = lightPressure.pressureMbar / heavyPressure.pressureMbar;
  if (relativeVolatility <= 1 + 1e-6) {
    return {
      ok: false,
      problem: 'The two liquids have the same vapour pressure here: distillation does not part them.',
    };
  }
  const notes = [
    'Ideal mixture assumed: azeotropes and non-ideal mixtures separate worse, look for a known azeotrope.',
  ];
  const doubt = Math.hypot(light.uncertaintyC, heavy.uncertaintyC);
  if (doubt > differenceC) {
    notes.push(
      `The boiling points are known to ±${doubt.toFixed(1)} °C together, more than they differ: the stages are a guess.`,
    );
  }
  return {
    ok: true,
    light,
    heavy,
    differenceC,
    meanTemperatureC,
    relativeVolatility,
    minimumStages: fenskeStages({
      lightInDistillate: lightPurity,
      lightInBottoms: 1 - heavyPurity,
      relativeVolatility,
    }),
    advice: adviseSeparation(differenceC, relativeVolatility),
    notes,
  };
}
