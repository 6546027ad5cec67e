'use client';
import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Combobox } from '@/components/ui/combobox';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { safetyChecks } from '@/lib/distillation/safety-checks';
import type { RunJson } from '@/lib/distillation/schema';
import { techniques } from '@/lib/distillation/techniques';
import { api } from '@/lib/http/client';
import { searchCompounds } from './compound-search';
import { FormPart } from './form-part';
import { ImpuritiesField } from './impurities-field';
import { PlannedCautions } from './planned-cautions';
import { PressureField } from './pressure-field';
import { failureOf, focusFirstProblem, problemsOf } from './problems-of';
import type { Problems } from './read-form';
import { emptyRunForm, readRunForm, type RunFormState } from './run-form-state';
import { usePressureUnit } from './use-pressure-unit';

type RunFormProps = { groups: readonly { id: string; name: string }[]; disabledReason: string | null };

/** Starts a run. Charge and target first; what can be added later is marked optional. */
export function RunForm({ groups, disabledReason }: RunFormProps) {
  const router = useRouter();
  const [unit] = usePressureUnit();
  const [state, setState] = useState<RunFormState>({
    ...emptyRunForm,
    group: groups.length > 1 ? '' : (groups[0]?.id ?? ''),
  });
  const [problems, setProblems] = useState<Problems>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const { body } = readRunForm(state, unit);

  const set = <K extends keyof RunFormState>(name: K, value: RunFormState[K]) =>
    setState((before) => ({ ...before, [name]: value }));
  const text = (
    name: 'chargeMass' | 'chargeSource' | 'chargeLot' | 'columnStages' | 'bath' | 'bathTemperature' | 'note',
  ) => ({
    value: state[name],
    onChange: (event: { target: { value: string } }) => set(name, event.target.value),
  });

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy || disabledReason) return;
    const read = readRunForm(state, unit);
    const missing: Problems =
      groups.length > 1 && !state.group ? { group: 'Choose the group that the run belongs to.' } : {};
    setProblems({ ...read.problems, ...missing });
    setFailure(null);
    if (!read.fine || missing.group) {
      setFailure('Some fields need another look: they are marked.');
      return focusFirstProblem(event.currentTarget);
    }
    setBusy(true);
    try {
      const run = await api<RunJson>('/api/v1/runs', { json: read.body });
      router.push(`/runs/${run.code}`);
    } catch (error) {
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
      setBusy(false);
    }
  }

  return (
    <form
      onSubmit={submit}
      noValidate
      className="grid items-start gap-6 lg:grid-cols-[minmax(0,32rem)_minmax(0,1fr)] lg:gap-10"
    >
      <div className="flex min-w-0 flex-col gap-6">
        <FormPart title="What is distilled">
          {groups.length > 1 ? (
            <Select
              label="Group"
              value={state.group}
              placeholder="Choose the group"
              options={groups.map(({ id, name }) => ({ value: id, label: name }))}
              error={problems.group}
              onChange={(event) => set('group', event.target.value)}
            />
          ) : null}
          <Combobox
            label="Target compound"
            hint="Name, synonym, CAS number or formula"
            search={searchCompounds}
            nothingFound="Nothing found: a PI can add it under Compounds."
            error={problems.targetCompound}
            required
            onChoose={(option) => set('target', option && { id: option.value, name: option.label })}
          />
          <ImpuritiesField
            chosen={state.impurities}
            onChange={(impurities) => set('impurities', impurities)}
            error={problems.knownImpurities}
          />
          <NumberField label="Charge" unit="g" error={problems.chargeMassG} {...text('chargeMass')} />
          <Field
            label="Source of the charge"
            hint="Reaction, batch, bottle or recovery that it comes from"
            error={problems.chargeSource}
            {...text('chargeSource')}
          />
          <Field label="Lot" optional error={problems.chargeLot} {...text('chargeLot')} />
        </FormPart>
        <FormPart title="How">
          <Select
            label="Technique"
            value={state.technique}
            placeholder="Choose the technique"
            options={techniques.map((technique) => ({ value: technique, label: technique }))}
            error={problems.technique}
            onChange={(event) => set('technique', event.target.value)}
          />
          <PressureField
            label="Planned pressure"
            optional
            hint="Absolute. Leave it out for the air's pressure."
            value={state.plannedPressure}
            onChange={(value) => set('plannedPressure', value)}
            error={problems.plannedPressureMbar}
          />
          <div className="grid gap-4 sm:grid-cols-2">
            <NumberField
              label="Theoretical stages"
              optional
              error={problems.columnStages}
              {...text('columnStages')}
            />
            <NumberField
              label="Bath temperature"
              optional
              unit="°C"
              error={problems.bathTemperatureC}
              {...text('bathTemperature')}
            />
          </div>
          <Field
            label="Bath"
            optional
            hint="Oil, sand, mantle, water"
            error={problems.bath}
            {...text('bath')}
          />
          <Textarea label="Note" optional error={problems.note} {...text('note')} />
        </FormPart>
      </div>
      <div className="flex min-w-0 flex-col gap-6 lg:sticky lg:top-20">
        <FormPart title="Before heating">
          <PlannedCautions
            compoundIds={[state.target, ...state.impurities].flatMap((each) => each?.id ?? [])}
            heatingTemperatureC={body.bathTemperatureC}
            pressureMbar={body.plannedPressureMbar}
          />
          <fieldset>
            <legend className="font-bold">Looked at</legend>
            {Object.entries(safetyChecks).map(([name, words]) => (
              <Checkbox
                key={name}
                label={words}
                checked={state.safetyChecks[name] ?? false}
                onChange={(event) =>
                  set('safetyChecks', { ...state.safetyChecks, [name]: event.target.checked })
                }
              />
            ))}
            <p className="mt-1 text-sm text-ink-soft">
              Kept with the run as what was looked at; it permits nothing.
            </p>
          </fieldset>
        </FormPart>
        {failure ? (
          <Notice kind="fails" title="The run was not started" live>
            {failure}
          </Notice>
        ) : null}
        <Button type="submit" variant="primary" busy={busy} disabledReason={disabledReason}>
          Start the run
        </Button>
      </div>
    </form>
  );
}
