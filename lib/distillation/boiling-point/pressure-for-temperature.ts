import { requireFinite } from '@/lib/units/require-number';
import {
  boilingPointAtPressure,
  HIGHEST_PRESSURE_MBAR,
  LOWEST_PRESSURE_MBAR,
  type BoilingPointMethod,
} from './boiling-point-at-pressure';
import { solveIncreasing } from './solve';
import type { VapourPressureData } from './vapour-pressure-data';

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

/**
 * The pressure at which a liquid boils at a wanted temperature: boilingPointAtPressure solved the other way, so
 * the two always agree on the method. Where the method changes with pressure the boiling point jumps by the
 * methods' disagreement; a temperature inside such a jump gets the pressure of the jump, and a note.
 *
 * @returns a problem, in words for the user, when the temperature lies outside 0.02 to 1999 mbar
 */
export function pressureForTemperature(data: VapourPressureData, temperatureC: number): PressureResult {
  requireFinite('Temperature (°C)', temperatureC);
  const logLow = Math.log10(LOWEST_PRESSURE_MBAR) + 1e-9;
  const logHigh = Math.log10(HIGHEST_PRESSURE_MBAR) - 1e-9;
  const pressureAt = (t: number): number =>
    10 **
    solveIncreasing((log) => boilingPointAtPressure(data, 10 ** log).boilingPointC - t, logLow, logHigh);
  const lowest = boilingPointAtPressure(data, 10 ** logLow).boilingPointC;
  const highest = boilingPointAtPressure(data, 10 ** logHigh).boilingPointC;
  if (temperatureC < lowest || temperatureC > highest) {
    return {
      ok: false,
      problem: `${data.name} boils at ${temperatureC.toFixed(1)} °C only outside ${LOWEST_PRESSURE_MBAR} to ${HIGHEST_PRESSURE_MBAR} mbar: choose a temperature between ${Math.ceil(lowest)} and ${Math.floor(highest)} °C.`,
    };
  }
  const pressureMbar = pressureAt(temperatureC);
  const there = boilingPointAtPressure(data, pressureMbar);
  const notes = [...there.notes];
  if (Math.abs(there.boilingPointC - temperatureC) > 0.01) {
    notes.push(
      'The method changes at this pressure: the temperature lies in the gap between the two methods.',
    );
  }
  const clamp = (t: number): number => Math.min(highest, Math.max(lowest, t));
  return {
    ok: true,
    pressureMbar,
    pressureLowMbar: pressureAt(clamp(temperatureC - there.uncertaintyC)),
    pressureHighMbar: pressureAt(clamp(temperatureC + there.uncertaintyC)),
    uncertaintyC: there.uncertaintyC,
    method: there.method,
    source: there.source,
    notes,
  };
}
