import { convertPressure } from '@/lib/units/pressure';
import { requireFinite, requireWithin } from '@/lib/units/require-number';
import { antoineBoilingPointC, antoineReach } from './antoine';
import { maxwellBonnellBoilingPointC, maxwellBonnellErrorC } from './maxwell-bonnell';
import { interpolate } from './solve';
import type { VapourPressureData } from './vapour-pressure-data';
import { wagnerBoilingPointC } from './wagner';

export type BoilingPointMethod = 'wagner' | 'antoine' | 'maxwell-bonnell';

export const METHOD_NAMES: Readonly<Record<BoilingPointMethod, string>> = {
  wagner: 'Wagner equation',
  antoine: 'Antoine equation',
  'maxwell-bonnell': 'Maxwell-Bonnell equation',
};

export type BoilingPointResult = {
  boilingPointC: number;
  /** Half-width that holds about 95 % of the liquids it was measured on. */
  uncertaintyC: number;
  method: BoilingPointMethod;
  source: string;
  notes: string[];
};

/** Pressures that a still is planned for, mbar: outside them no method here has a stated error. */
export const LOWEST_PRESSURE_MBAR = 0.02;
export const HIGHEST_PRESSURE_MBAR = 1999;

const LOG_MMHG = [0.1, 1, 10, 100, 300, 760].map((p) => Math.log10(p));
/**
 * 95 % agreement of the Wagner and the Antoine sets of the reference table with each other (1.0 °C at 10 to
 * 50 mmHg over 100 liquids, 0.8 °C from 100 mmHg on); below 10 mmHg few sets can be compared, so it is widened.
 */
const FITTED_C = [4, 2.5, 1, 0.9, 0.8, 0.8];

/** 95 % half-width of a fitted vapour-pressure equation at a pressure, °C. */
export function fittedEquationErrorC(pressureMbar: number): number {
  return interpolate(LOG_MMHG, FITTED_C, Math.log10(convertPressure(pressureMbar, 'mbar', 'mmHg')));
}

/**
 * Boiling point at a pressure: Wagner where there is a set that covers it, else Antoine inside its range (at most
 * 5 °C beyond it), else Maxwell-Bonnell corrected by class. The uncertainty is never less than the disagreement
 * between the sets at hand.
 *
 * @param pressureMbar absolute, 0.02 to 1999 mbar
 * @throws RangeError when the pressure is out of range or the normal boiling point is no temperature
 */
export function boilingPointAtPressure(data: VapourPressureData, pressureMbar: number): BoilingPointResult {
  requireWithin('Pressure (mbar)', pressureMbar, LOWEST_PRESSURE_MBAR, HIGHEST_PRESSURE_MBAR);
  requireFinite('Normal boiling point (°C)', data.normalBoilingPointC);
  return (
    byWagner(data, pressureMbar) ?? byAntoine(data, pressureMbar) ?? byMaxwellBonnell(data, pressureMbar)
  );
}

function byWagner(data: VapourPressureData, pressureMbar: number): BoilingPointResult | null {
  const set = data.wagner;
  if (!set) return null;
  let boilingPointC: number;
  try {
    boilingPointC = wagnerBoilingPointC(set, pressureMbar / 10);
  } catch {
    return null;
  }
  const notes: string[] = [];
  let uncertaintyC = fittedEquationErrorC(pressureMbar);
  const antoineC = antoineInside(data, pressureMbar);
  if (antoineC !== null && Math.abs(antoineC - boilingPointC) > 0.5) {
    const gap = Math.abs(antoineC - boilingPointC);
    uncertaintyC = Math.max(uncertaintyC, gap);
    notes.push(
      `The Antoine set gives ${antoineC.toFixed(1)} °C: the sources differ by ${gap.toFixed(1)} °C.`,
    );
  }
  return { boilingPointC, uncertaintyC, method: 'wagner', source: set.source, notes };
}

function antoineInside(data: VapourPressureData, pressureMbar: number): number | null {
  if (!data.antoine) return null;
  try {
    const t = antoineBoilingPointC(data.antoine, pressureMbar / 10);
    return antoineReach(data.antoine, t) === 'inside' ? t : null;
  } catch {
    return null;
  }
}

function byAntoine(data: VapourPressureData, pressureMbar: number): BoilingPointResult | null {
  const set = data.antoine;
  if (!set) return null;
  let boilingPointC: number;
  try {
    boilingPointC = antoineBoilingPointC(set, pressureMbar / 10);
  } catch {
    return null;
  }
  const reach = antoineReach(set, boilingPointC);
  if (reach === 'outside') return null;
  const notes =
    reach === 'inside' ? [] : [`Up to 5 °C beyond the range of the set, ${set.tMinC} to ${set.tMaxC} °C.`];
  const uncertaintyC = fittedEquationErrorC(pressureMbar) + (reach === 'inside' ? 0 : 0.5);
  return { boilingPointC, uncertaintyC, method: 'antoine', source: set.source, notes };
}

/** Maxwell-Bonnell with the correction of the liquid's class; the fallback that always answers. */
export function byMaxwellBonnell(data: VapourPressureData, pressureMbar: number): BoilingPointResult {
  const pressureMmHg = convertPressure(pressureMbar, 'mbar', 'mmHg');
  const association = data.associated ? (data.associationClass ?? 'other') : 'none';
  const { addC, uncertaintyC } = maxwellBonnellErrorC(pressureMmHg, association);
  const plainC = maxwellBonnellBoilingPointC(data.normalBoilingPointC, pressureMmHg);
  const notes = [
    `Estimated from the normal boiling point alone, ${data.normalBoilingPointC.toFixed(1)} °C; expected error ${uncertaintyC.toFixed(1)} °C (95 %).`,
  ];
  if (association !== 'none') {
    const sign = addC < 0 ? 'lowered' : 'raised';
    notes.push(
      `${data.name} associates: the equation's ${plainC.toFixed(1)} °C was ${sign} by ${Math.abs(addC).toFixed(1)} °C, the mean for its class.`,
    );
  }
  if (pressureMmHg < 0.1)
    notes.push('Below 0.1 mmHg the error was never measured: it is widened by a guess.');
  return {
    boilingPointC: plainC + addC,
    uncertaintyC,
    method: 'maxwell-bonnell',
    source: `Maxwell and Bonnell (1957), from the normal boiling point: ${data.normalBoilingPointSource}`,
    notes,
  };
}
