import { requireFinite } from '@/lib/units/require-number';
import { antoinePressureKPa, antoineReach } from './antoine';
import {
  boilingPointAtPressure,
  byMaxwellBonnell,
  HIGHEST_PRESSURE_MBAR,
  LOWEST_PRESSURE_MBAR,
  type BoilingPointMethod,
  type BoilingPointResult,
} from './boiling-point-at-pressure';
import { solveIncreasing } from './solve';
import type { VapourPressureData } from './vapour-pressure-data';
import { wagnerPressureKPa, wagnerRangeC } from './wagner';

export type PressureResult =
  | {
      ok: true;
      pressureMbar: number;
      /** Pressures at which the boiling point's 95 % limits meet the wanted temperature. */
      pressureLowMbar: number;
      pressureHighMbar: number;
      /** 95 % half-width of the boiling point at that pressure. */
      uncertaintyC: number;
      method: BoilingPointMethod;
      source: string;
      notes: string[];
    }
  | { ok: false; problem: string };

// A hair inside the limits, so that a rounded end is not refused.
const LOG_LOW = Math.log10(LOWEST_PRESSURE_MBAR) + 1e-9;
const LOG_HIGH = Math.log10(HIGHEST_PRESSURE_MBAR) - 1e-9;

/**
 * The pressure at which a liquid boils at a wanted temperature: the equations of boilingPointAtPressure the other
 * way, in the same order (Wagner, Antoine in its range, Maxwell-Bonnell). Where two methods meet, the same
 * temperature may be answered by the better of the two.
 *
 * @returns a problem, in words for the user, when the temperature lies outside 0.02 to 1999 mbar
 * @throws RangeError when the temperature is no number
 */
export function pressureForTemperature(data: VapourPressureData, temperatureC: number): PressureResult {
  requireFinite('Temperature (°C)', temperatureC);
  const found = locate(data, temperatureC);
  if (!found) {
    const lowestC = boilingPointAtPressure(data, 10 ** LOG_LOW).boilingPointC;
    const highestC = boilingPointAtPressure(data, 10 ** LOG_HIGH).boilingPointC;
    return {
      ok: false,
      problem: `${data.name} boils at ${temperatureC.toFixed(1)} °C only outside ${LOWEST_PRESSURE_MBAR} to ${HIGHEST_PRESSURE_MBAR} mbar: choose a temperature between ${Math.ceil(lowestC)} and ${Math.floor(highestC)} °C.`,
    };
  }
  const { pressureMbar, there } = found;
  return {
    ok: true,
    pressureMbar,
    pressureLowMbar: limit(data, temperatureC - there.uncertaintyC, LOWEST_PRESSURE_MBAR, pressureMbar),
    pressureHighMbar: limit(data, temperatureC + there.uncertaintyC, pressureMbar, HIGHEST_PRESSURE_MBAR),
    uncertaintyC: there.uncertaintyC,
    method: there.method,
    source: there.source,
    notes: there.notes,
  };
}

function locate(
  data: VapourPressureData,
  temperatureC: number,
): { pressureMbar: number; there: BoilingPointResult } | null {
  const direct = fittedPressureMbar(data, temperatureC);
  if (direct !== null) {
    if (direct < LOWEST_PRESSURE_MBAR || direct > HIGHEST_PRESSURE_MBAR) return null;
    return { pressureMbar: direct, there: boilingPointAtPressure(data, direct) };
  }
  const at = (log: number): number => byMaxwellBonnell(data, 10 ** log).boilingPointC - temperatureC;
  if (at(LOG_LOW) > 0 || at(LOG_HIGH) < 0) return null;
  const pressureMbar = 10 ** solveIncreasing(at, LOG_LOW, LOG_HIGH);
  return { pressureMbar, there: byMaxwellBonnell(data, pressureMbar) };
}

/** Pressure by Wagner, else by Antoine, where the temperature lies in their ranges; else null. */
function fittedPressureMbar(data: VapourPressureData, temperatureC: number): number | null {
  if (data.wagner) {
    const { lowC, highC } = wagnerRangeC(data.wagner);
    if (temperatureC >= lowC && temperatureC <= highC)
      return 10 * wagnerPressureKPa(data.wagner, temperatureC);
  }
  if (data.antoine && antoineReach(data.antoine, temperatureC) !== 'outside') {
    return 10 * antoinePressureKPa(data.antoine, temperatureC);
  }
  return null;
}

/** Pressure of a limit of the temperature, held between the given pressures; their far end where out of reach. */
function limit(data: VapourPressureData, temperatureC: number, lowMbar: number, highMbar: number): number {
  const found = locate(data, Math.max(temperatureC, -273));
  const farEnd = lowMbar === LOWEST_PRESSURE_MBAR ? lowMbar : highMbar;
  return Math.min(highMbar, Math.max(lowMbar, found?.pressureMbar ?? farEnd));
}
