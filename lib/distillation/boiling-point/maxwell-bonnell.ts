import { requireWithin } from '@/lib/units/require-number';
import { celsiusFromKelvin, kelvinFromCelsius } from '@/lib/units/temperature';
import type { AssociationClass } from './associates';
import { interpolate, solveIncreasing } from './solve';

/** Pressures over which the equation's error was measured or is still stated, mmHg. */
export const MAXWELL_BONNELL_LOW_MMHG = 0.01;
export const MAXWELL_BONNELL_HIGH_MMHG = 1500;

function xOf(temperatureK: number, normalBoilingK: number): number {
  return (normalBoilingK / temperatureK - 0.00051606 * normalBoilingK) / (748.1 - 0.3861 * normalBoilingK);
}

/**
 * log10 of the vapour pressure in mmHg at a temperature, from the normal boiling point alone (Maxwell & Bonnell
 * 1957, the equation behind ASTM D1160 and the printed nomographs; coefficients from memory).
 * At the normal boiling point it returns 762.9 mmHg, not 760: 0.2 °C, inside its stated error.
 */
export function maxwellBonnellLogMmHg(temperatureC: number, normalBoilingPointC: number): number {
  requireWithin('Normal boiling point (°C)', normalBoilingPointC, -150, 700);
  const x = xOf(kelvinFromCelsius(temperatureC), kelvinFromCelsius(normalBoilingPointC));
  if (x > 0.0022) return (3000.538 * x - 6.76156) / (43 * x - 0.987672);
  if (x >= 0.0013) return (2663.129 * x - 5.994296) / (95.76 * x - 0.972546);
  return (2770.085 * x - 6.412631) / (36 * x - 0.989679);
}

/** Boiling point in °C at a pressure of 0.01 to 1500 mmHg, as the equation gives it: no correction by class. */
export function maxwellBonnellBoilingPointC(normalBoilingPointC: number, pressureMmHg: number): number {
  requireWithin(
    'Pressure (mmHg) for Maxwell-Bonnell',
    pressureMmHg,
    MAXWELL_BONNELL_LOW_MMHG,
    MAXWELL_BONNELL_HIGH_MMHG,
  );
  const normalK = kelvinFromCelsius(
    requireWithin('Normal boiling point (°C)', normalBoilingPointC, -150, 700),
  );
  const target = Math.log10(pressureMmHg);
  return solveIncreasing(
    (c) => maxwellBonnellLogMmHg(c, normalBoilingPointC) - target,
    celsiusFromKelvin(0.4 * normalK),
    celsiusFromKelvin(1.2 * normalK),
  );
}

/** Pressures at which the error was measured, mmHg. */
const NODES_LOG_MMHG = [0.1, 1, 10, 50, 100, 300, 760, 1500].map((p) => Math.log10(p));

type ErrorTable = { lowByC: readonly number[]; ninetyFivePercentC: readonly number[] };

/**
 * How far the equation reads low, and the half-width that then holds 95 % of the liquids, measured against the
 * Wagner sets of the reference table (VDI Heat Atlas coefficients): 80 liquids that do not associate, 14 alcohols
 * and glycols, 5 carboxylic acids (twice their standard deviation: they are few and unlike each other), and all
 * associated liquids together for those whose class is not known.
 */
const ERRORS: Readonly<Record<AssociationClass | 'none', ErrorTable>> = {
  none: { lowByC: [0, 0, 0, 0, 0, 0, 0, 0], ninetyFivePercentC: [8, 6.2, 5.5, 4.4, 3.7, 2.2, 0.6, 2.1] },
  alcohol: {
    lowByC: [21.7, 19.4, 16.4, 12.6, 10.3, 5.6, 0, -5],
    ninetyFivePercentC: [9, 7, 6.1, 5.1, 4.4, 2.8, 1.3, 2.7],
  },
  acid: {
    lowByC: [9.9, 9.3, 8.8, 7.3, 6.1, 3.4, 0, -3.8],
    ninetyFivePercentC: [22, 18.5, 14.6, 10.5, 8.3, 4.2, 0.6, 2.5],
  },
  other: {
    lowByC: [20, 18, 14, 11, 9, 5, 0, -4.5],
    ninetyFivePercentC: [19, 15, 10, 7, 5.5, 3, 1.3, 2.7],
  },
};

/**
 * What to add to the equation's boiling point for the liquid's class, and the 95 % half-width that stays, both in
 * °C; straight lines in log10(P) between the measured pressures. Below 0.1 mmHg the half-width is widened by half
 * for each decade, since nothing was measured there.
 */
export function maxwellBonnellErrorC(
  pressureMmHg: number,
  association: AssociationClass | 'none',
): { addC: number; uncertaintyC: number } {
  const log = Math.log10(
    requireWithin('Pressure (mmHg)', pressureMmHg, MAXWELL_BONNELL_LOW_MMHG, MAXWELL_BONNELL_HIGH_MMHG),
  );
  const table = ERRORS[association];
  const widen = log < -1 ? 1 + 0.5 * (-1 - log) : 1;
  return {
    addC: interpolate(NODES_LOG_MMHG, table.lowByC, log),
    uncertaintyC: widen * interpolate(NODES_LOG_MMHG, table.ninetyFivePercentC, log),
  };
}
