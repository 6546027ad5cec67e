import type { FractionJson } from '@/lib/distillation/fraction-schema';
import { cuts, type Cut } from '@/lib/distillation/fraction-states';
import type { PressureUnit } from '@/lib/units/pressure';
import { FormReader, numberText, pressureText } from './read-form';

/** What a person has typed of a fraction; numbers as text. */
export type FractionFormState = {
  cut: Cut | '';
  tare: string;
  gross: string;
  headFrom: string;
  headTo: string;
  pressure: string;
  appearance: string;
  storagePlace: string;
  reason: string;
};

export function fractionFormOf(fraction: FractionJson | null, unit: PressureUnit): FractionFormState {
  return {
    cut: fraction?.cut ?? '',
    tare: numberText(fraction?.tareMassG ?? null),
    gross: numberText(fraction?.grossMassG ?? null),
    headFrom: numberText(fraction?.headTemperatureFromC ?? null),
    headTo: numberText(fraction?.headTemperatureToC ?? null),
    pressure: pressureText(fraction?.pressureMbar ?? null, unit),
    appearance: fraction?.appearance ?? '',
    storagePlace: fraction?.storagePlace ?? '',
    reason: '',
  };
}

/**
 * The body to send, or the problems by field. A pressure that was not touched is sent as it is kept, so
 * that showing it in another unit never rounds it.
 */
export function readFractionForm(state: FractionFormState, unit: PressureUnit, kept: FractionJson | null) {
  const read = new FormReader();
  const untouched = kept !== null && state.pressure === pressureText(kept.pressureMbar, unit);
  const body = {
    cut: state.cut,
    tareMassG: read.massG('tareMassG', state.tare),
    grossMassG: read.massG('grossMassG', state.gross),
    headTemperatureFromC: read.temperatureC('headTemperatureFromC', state.headFrom),
    headTemperatureToC: read.temperatureC('headTemperatureToC', state.headTo),
    pressureMbar: untouched ? kept.pressureMbar : read.pressureMbar('pressureMbar', state.pressure, unit),
    appearance: state.appearance.trim() || null,
    storagePlace: state.storagePlace.trim() || null,
    ...(state.reason.trim() && { reason: state.reason.trim() }),
  };
  read.require('cut', (cuts as readonly string[]).includes(state.cut), 'Choose the cut.');
  if (body.tareMassG !== null && body.grossMassG !== null && body.grossMassG < body.tareMassG) {
    read.require(
      'grossMassG',
      false,
      'The gross mass is below the tare: check that the two are not swapped.',
    );
  }
  return { body, problems: read.problems, fine: read.fine };
}
