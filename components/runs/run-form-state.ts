import type { NewRun } from '@/lib/distillation/schema';
import type { PressureUnit } from '@/lib/units/pressure';
import type { Chosen } from './impurities-field';
import { FormReader } from './read-form';

/** What a person has typed of a run, at its start or later; numbers as text. */
export type RunFacts = {
  impurities: Chosen[];
  technique: string;
  chargeMass: string;
  chargeSource: string;
  chargeLot: string;
  columnStages: string;
  bath: string;
  bathTemperature: string;
  plannedPressure: string;
  safetyChecks: Record<string, boolean>;
  note: string;
};

export type RunFormState = RunFacts & { group: string; target: Chosen | null };

export const emptyRunForm: RunFormState = {
  group: '',
  target: null,
  impurities: [],
  technique: '',
  chargeMass: '',
  chargeSource: '',
  chargeLot: '',
  columnStages: '',
  bath: '',
  bathTemperature: '',
  plannedPressure: '',
  safetyChecks: {},
  note: '',
};

/** The facts as the API takes them; problems go into `read`. */
export function readRunFacts(read: FormReader, state: RunFacts, unit: PressureUnit) {
  const chargeMassG = read.massG('chargeMassG', state.chargeMass);
  const facts = {
    knownImpurities: state.impurities.map((each) => each.id),
    technique: state.technique as NewRun['technique'],
    chargeMassG: chargeMassG ?? 0,
    chargeSource: state.chargeSource.trim(),
    chargeLot: state.chargeLot.trim() || null,
    columnStages: read.number('columnStages', state.columnStages),
    bath: state.bath.trim() || null,
    bathTemperatureC: read.temperatureC('bathTemperatureC', state.bathTemperature),
    plannedPressureMbar: read.pressureMbar('plannedPressureMbar', state.plannedPressure, unit),
    safetyChecks: state.safetyChecks,
    note: state.note.trim() || null,
  };
  read.require('technique', state.technique !== '', 'Choose how you distil.');
  read.require('chargeMassG', (chargeMassG ?? 0) > 0, 'Enter the mass of the charge, for example "250 g".');
  read.require('chargeSource', facts.chargeSource !== '', 'Say where the charge comes from.');
  return facts;
}

/** The body of a new run to send, or the problems by field. */
export function readRunForm(state: RunFormState, unit: PressureUnit) {
  const read = new FormReader();
  const body = {
    ...(state.group && { group: state.group }),
    targetCompound: state.target?.id ?? '',
    ...readRunFacts(read, state, unit),
  };
  read.require('targetCompound', state.target !== null, 'Choose the compound that you want to collect.');
  return { body, problems: read.problems, fine: read.fine };
}
