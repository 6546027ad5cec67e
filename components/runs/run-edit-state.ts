import type { RunChange, RunJson } from '@/lib/distillation/schema';
import type { PressureUnit } from '@/lib/units/pressure';
import { FormReader, numberText, pressureText } from './read-form';
import { readRunFacts, type RunFacts } from './run-form-state';

/** What a person has typed of a run that was started before. */
export type RunEditState = RunFacts & { residueMass: string; reason: string };

export function runEditOf(run: RunJson, unit: PressureUnit): RunEditState {
  return {
    impurities: run.knownImpurities.map(({ id, name }) => ({ id, name })),
    technique: run.technique,
    chargeMass: numberText(run.chargeMassG),
    chargeSource: run.chargeSource,
    chargeLot: run.chargeLot ?? '',
    columnStages: numberText(run.columnStages),
    bath: run.bath ?? '',
    bathTemperature: numberText(run.bathTemperatureC),
    plannedPressure: pressureText(run.plannedPressureMbar, unit),
    safetyChecks: { ...run.safetyChecks },
    note: run.note ?? '',
    residueMass: numberText(run.residueMassG),
    reason: '',
  };
}

type Facts = Omit<RunChange, 'reason' | 'startedAt' | 'endedAt'>;

/** The facts of a run in the shape of a change of it, so that the two can be compared. */
function factsOf(run: RunJson): Facts {
  const { technique, chargeMassG, chargeSource, chargeLot, columnStages, bath, bathTemperatureC } = run;
  const { plannedPressureMbar, safetyChecks, note, residueMassG } = run;
  const knownImpurities = run.knownImpurities.map((each) => each.id);
  return {
    technique: technique as RunChange['technique'],
    ...{ chargeMassG, chargeSource, chargeLot, columnStages, bath, bathTemperatureC },
    ...{ plannedPressureMbar, safetyChecks, note, residueMassG, knownImpurities },
  };
}

/** The same text for what means the same: a list in any order, a box that is not ticked and one never touched. */
function sameAs(value: unknown): string {
  if (Array.isArray(value)) return JSON.stringify([...value].sort());
  if (value && typeof value === 'object') {
    const ticked = Object.entries(value).filter(([, on]) => on);
    return JSON.stringify(ticked.map(([name]) => name).sort());
  }
  return JSON.stringify(value ?? null);
}

/** The names of the facts in which two states of a run differ. */
export function changedRunFacts(before: RunJson, after: RunJson): (keyof Facts)[] {
  const [a, b] = [factsOf(before), factsOf(after)];
  return (Object.keys(a) as (keyof Facts)[]).filter((name) => sameAs(a[name]) !== sameAs(b[name]));
}

/**
 * The change to send: only what differs from the run as it was opened, so that what somebody else changed meanwhile
 * stays. A pressure that was not touched counts as kept, so that showing it in another unit never rounds it. A reason is
 * needed when known impurities change under a signed-off fraction.
 */
export function readRunEdit(state: RunEditState, unit: PressureUnit, opened: RunJson, signedOff: boolean) {
  const read = new FormReader();
  const typed: Facts = {
    ...readRunFacts(read, state, unit),
    residueMassG: read.massG('residueMassG', state.residueMass),
  };
  const kept = factsOf(opened);
  if (state.plannedPressure === pressureText(opened.plannedPressureMbar, unit))
    typed.plannedPressureMbar = kept.plannedPressureMbar;
  const names = (Object.keys(typed) as (keyof Facts)[]).filter(
    (name) => sameAs(typed[name]) !== sameAs(kept[name]),
  );
  const needsReason = signedOff && names.includes('knownImpurities');
  const reason = state.reason.trim();
  read.require(
    'reason',
    !needsReason || reason !== '',
    'Say why: this change ends the signature of a fraction.',
  );
  const body: RunChange = {
    ...Object.fromEntries(names.map((name) => [name, typed[name]])),
    ...(reason && { reason }),
  };
  return { body, problems: read.problems, fine: read.fine, needsReason, changed: names.length > 0 };
}

/** The facts in the words of the form. */
export const runFactNames: Record<keyof Facts, string> = {
  technique: 'technique',
  chargeMassG: 'charge',
  chargeSource: 'source of the charge',
  chargeLot: 'lot',
  columnStages: 'theoretical stages',
  bath: 'bath',
  bathTemperatureC: 'bath temperature',
  plannedPressureMbar: 'planned pressure',
  safetyChecks: 'what was looked at',
  residueMassG: 'residue',
  note: 'note',
  knownImpurities: 'known impurities',
};
