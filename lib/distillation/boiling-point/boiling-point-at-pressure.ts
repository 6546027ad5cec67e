import { convertPressure, STANDARD_ATMOSPHERE_MBAR } from '@/lib/units/pressure';
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

/** Sources that differ by more than this are mentioned, °C. */
const NOTEWORTHY_GAP_C = 0.5;

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
 * between the sets and the normal boiling point at hand.
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

/** The Wagner answer, or null where there is no set or it does not cover the pressure. */
function byWagner(data: VapourPressureData, pressureMbar: number): BoilingPointResult | null {
  const set = data.wagner;
  const boilingPointC = set ? attempt(() => wagnerBoilingPointC(set, pressureMbar / 10)) : null;
  if (!set || boilingPointC === null) return null;
  const notes: string[] = [];
  const normalC = attempt(() => wagnerBoilingPointC(set, STANDARD_ATMOSPHERE_MBAR / 10));
  let uncertaintyC = Math.max(fittedEquationErrorC(pressureMbar), noteNormalGap(data, normalC, notes));
  const antoine = data.antoine;
  const antoineC = antoine ? attempt(() => antoineBoilingPointC(antoine, pressureMbar / 10)) : null;
  if (antoine && antoineC !== null && antoineReach(antoine, antoineC) === 'inside') {
    const gap = Math.abs(antoineC - boilingPointC);
    uncertaintyC = Math.max(uncertaintyC, gap);
    if (gap > NOTEWORTHY_GAP_C) {
      notes.push(
        `The Antoine set gives ${antoineC.toFixed(1)} °C: the sources differ by ${gap.toFixed(1)} °C.`,
      );
    }
  }
  return { boilingPointC, uncertaintyC, method: 'wagner', source: set.source, notes };
}

/** The Antoine answer, or null where there is no set or the boiling point lies too far outside its range. */
function byAntoine(data: VapourPressureData, pressureMbar: number): BoilingPointResult | null {
  const set = data.antoine;
  const boilingPointC = set ? attempt(() => antoineBoilingPointC(set, pressureMbar / 10)) : null;
  if (!set || boilingPointC === null) return null;
  const reach = antoineReach(set, boilingPointC);
  if (reach === 'outside') return null;
  const notes: string[] = [];
  const normalC = attempt(() => antoineBoilingPointC(set, STANDARD_ATMOSPHERE_MBAR / 10));
  let uncertaintyC = Math.max(fittedEquationErrorC(pressureMbar), noteNormalGap(data, normalC, notes));
  if (reach === 'extrapolated') {
    uncertaintyC += 0.5;
    notes.push(`Up to 5 °C beyond the range of the set, ${set.tMinC} to ${set.tMaxC} °C.`);
  }
  return { boilingPointC, uncertaintyC, method: 'antoine', source: set.source, notes };
}

/** How far a set's own normal boiling point lies from the recorded one, °C; said in a note when it matters. */
function noteNormalGap(data: VapourPressureData, setNormalC: number | null, notes: string[]): number {
  if (setNormalC === null) return 0;
  const gap = Math.abs(setNormalC - data.normalBoilingPointC);
  if (gap > NOTEWORTHY_GAP_C) {
    notes.push(
      `The set boils at ${setNormalC.toFixed(1)} °C at 1 atm, ${data.normalBoilingPointC.toFixed(1)} °C is recorded.`,
    );
  }
  return gap;
}

/** The value, or null where an equation does not reach. */
function attempt(compute: () => number): number | null {
  try {
    return compute();
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
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
