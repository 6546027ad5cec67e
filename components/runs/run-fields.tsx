'use client';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { safetyChecks } from '@/lib/distillation/safety-checks';
import { techniques } from '@/lib/distillation/techniques';
import { ImpuritiesField } from './impurities-field';
import { PressureField } from './pressure-field';
import type { Problems } from './read-form';
import type { RunFacts } from './run-form-state';

export type RunFieldsProps = {
  state: RunFacts;
  set: (part: Partial<RunFacts>) => void;
  problems: Problems;
};

type TextName = Exclude<keyof RunFacts, 'impurities' | 'safetyChecks'>;

function textOf({ state, set }: RunFieldsProps, name: TextName) {
  return {
    value: state[name],
    onChange: (event: { target: { value: string } }) => set({ [name]: event.target.value }),
  };
}

/** What is in the still: known impurities, charge and where it comes from. */
export function ChargeFields(props: RunFieldsProps) {
  const { state, set, problems } = props;
  return (
    <>
      <ImpuritiesField
        chosen={state.impurities}
        onChange={(impurities) => set({ impurities })}
        error={problems.knownImpurities}
      />
      <NumberField label="Charge" unit="g" error={problems.chargeMassG} {...textOf(props, 'chargeMass')} />
      <Field
        label="Source of the charge"
        hint="Reaction, batch, bottle or recovery that it comes from"
        error={problems.chargeSource}
        {...textOf(props, 'chargeSource')}
      />
      <Field label="Lot" optional error={problems.chargeLot} {...textOf(props, 'chargeLot')} />
    </>
  );
}

/** How it is distilled: technique, pressure, stages and bath. */
export function StillFields(props: RunFieldsProps) {
  const { state, set, problems } = props;
  return (
    <>
      <Select
        label="Technique"
        value={state.technique}
        placeholder="Choose the technique"
        options={techniques.map((technique) => ({ value: technique, label: technique }))}
        error={problems.technique}
        onChange={(event) => set({ technique: event.target.value })}
      />
      <PressureField
        label="Planned pressure"
        optional
        hint="Absolute. Leave it out for the air's pressure."
        value={state.plannedPressure}
        onChange={(plannedPressure) => set({ plannedPressure })}
        error={problems.plannedPressureMbar}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <NumberField
          label="Theoretical stages"
          optional
          error={problems.columnStages}
          {...textOf(props, 'columnStages')}
        />
        <NumberField
          label="Bath temperature"
          optional
          unit="°C"
          error={problems.bathTemperatureC}
          {...textOf(props, 'bathTemperature')}
        />
      </div>
      <Field
        label="Bath"
        optional
        hint="Oil, sand, mantle, water"
        error={problems.bath}
        {...textOf(props, 'bath')}
      />
      <Textarea label="Note" optional error={problems.note} {...textOf(props, 'note')} />
    </>
  );
}

/** What was looked at before heating. */
export function SafetyFields({ state, set }: Pick<RunFieldsProps, 'state' | 'set'>) {
  return (
    <fieldset>
      <legend className="font-bold">Looked at</legend>
      {Object.entries(safetyChecks).map(([name, words]) => (
        <Checkbox
          key={name}
          label={words}
          checked={state.safetyChecks[name] ?? false}
          onChange={(event) => set({ safetyChecks: { ...state.safetyChecks, [name]: event.target.checked } })}
        />
      ))}
      <p className="mt-1 text-sm text-ink-soft">
        Kept with the run as what was looked at; it permits nothing.
      </p>
    </fieldset>
  );
}
