'use client';
import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Combobox } from '@/components/ui/combobox';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import type { RunJson } from '@/lib/distillation/schema';
import { api } from '@/lib/http/client';
import { searchCompounds } from './compound-search';
import { FormPart } from './form-part';
import { PlannedCautions } from './planned-cautions';
import { failureOf, focusFirstProblem, problemsOf } from './problems-of';
import type { Problems } from './read-form';
import { ChargeFields, SafetyFields, StillFields } from './run-fields';
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

  const set = (part: Partial<RunFormState>) => setState((before) => ({ ...before, ...part }));
  const fields = { state, set, problems };

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
              onChange={(event) => set({ group: event.target.value })}
            />
          ) : null}
          <Combobox
            label="Target compound"
            hint="Name, synonym, CAS number or formula"
            search={searchCompounds}
            nothingFound="Nothing found: a PI can add it under Compounds."
            error={problems.targetCompound}
            required
            onChoose={(option) => set({ target: option && { id: option.value, name: option.label } })}
          />
          <ChargeFields {...fields} />
        </FormPart>
        <FormPart title="How">
          <StillFields {...fields} />
        </FormPart>
      </div>
      <div className="flex min-w-0 flex-col gap-6 lg:sticky lg:top-20">
        <FormPart title="Before heating">
          <PlannedCautions
            compoundIds={[state.target, ...state.impurities].flatMap((each) => each?.id ?? [])}
            heatingTemperatureC={body.bathTemperatureC}
            pressureMbar={body.plannedPressureMbar}
          />
          <SafetyFields {...fields} />
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
