'use client';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { Textarea } from '@/components/ui/textarea';
import { sayDone } from '@/components/ui/toaster';
import type { RunJson } from '@/lib/distillation/schema';
import { FormPart } from './form-part';
import { focusFirstProblem } from './problems-of';
import { changedRunFacts, readRunEdit, runEditOf, runFactNames, type RunEditState } from './run-edit-state';
import { ChargeFields, SafetyFields, StillFields } from './run-fields';
import { type ChosenPressureUnit, usePressureUnit } from './use-pressure-unit';
import { useSaveRun } from './use-save-run';

type RunEditFormProps = {
  run: RunJson;
  /** Codes of the run's fractions that are signed off. */
  signedOff: readonly string[];
  disabledReason: string | null;
};

/** Corrects and completes the facts of a run after its start. */
export function RunEditForm(props: RunEditFormProps) {
  const [unit] = usePressureUnit();
  return <Form unit={unit} {...props} />;
}

function Form({ run, signedOff, disabledReason, unit }: RunEditFormProps & { unit: ChosenPressureUnit }) {
  const router = useRouter();
  // The version that was opened: the page may bring a newer one while something is being typed.
  const [opened] = useState(run);
  const [openedUnit, setOpenedUnit] = useState(unit);
  const [state, setState] = useState<RunEditState>(() => runEditOf(opened, unit));
  const { save, busy, newer, problems, setProblems, failure, setFailure } = useSaveRun(opened);
  const set = (part: Partial<RunEditState>) => setState((before) => ({ ...before, ...part }));
  if (unit !== openedUnit) {
    // An untouched pressure is shown in the unit that now stands beside it; what was typed stays as typed.
    setOpenedUnit(unit);
    if (state.plannedPressure === runEditOf(opened, openedUnit).plannedPressure)
      set({ plannedPressure: runEditOf(opened, unit).plannedPressure });
  }
  const { needsReason } = readRunEdit(state, unit, opened, signedOff.length > 0);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy || disabledReason) return;
    const form = event.currentTarget;
    const read = readRunEdit(state, unit, opened, signedOff.length > 0);
    setProblems(read.problems);
    setFailure(null);
    if (!read.fine) {
      setFailure('Some fields need another look: they are marked.');
      return focusFirstProblem(form);
    }
    if (!read.changed) return router.push(`/runs/${run.code}`);
    if (!(await save(read.body))) return focusFirstProblem(form);
    sayDone(`${run.code} is kept.`);
    router.push(`/runs/${run.code}`);
    router.refresh();
  }

  const changedElsewhere = newer ? changedRunFacts(opened, newer).map((name) => runFactNames[name]) : [];
  const fields = { state, set, problems };
  return (
    <form
      onSubmit={submit}
      noValidate
      className="grid items-start gap-6 lg:grid-cols-[minmax(0,32rem)_minmax(0,1fr)] lg:gap-10"
    >
      <div className="flex min-w-0 flex-col gap-6">
        <FormPart title="What is distilled">
          <ChargeFields {...fields} />
        </FormPart>
        <FormPart title="How">
          <StillFields {...fields} />
        </FormPart>
      </div>
      <div className="flex min-w-0 flex-col gap-6">
        <div id="residue" className="scroll-mt-20">
          <FormPart title="What stayed behind">
            <NumberField
              label="Residue in the still"
              optional
              unit="g"
              hint="Net mass: it completes the mass balance."
              value={state.residueMass}
              error={problems.residueMassG}
              onChange={(event) => set({ residueMass: event.target.value })}
            />
          </FormPart>
        </div>
        <FormPart title="Before heating">
          <SafetyFields {...fields} />
        </FormPart>
        <Textarea
          label="Reason for the change"
          optional={!needsReason}
          hint={
            needsReason
              ? `Signed off: ${signedOff.join(', ')}. Other known impurities end these signatures, which stay readable.`
              : 'Kept in the history.'
          }
          value={state.reason}
          error={problems.reason}
          onChange={(event) => set({ reason: event.target.value })}
        />
        {newer ? (
          <Notice kind="fails" title="Somebody changed this run in the meantime" live>
            <p>
              Nothing was kept yet, and what you typed is still here.{' '}
              {changedElsewhere.length > 0
                ? `Changed since you opened it: ${changedElsewhere.join(', ')}.`
                : 'None of the facts on this page was changed.'}{' '}
              <Link href={`/runs/${run.code}`} target="_blank" className="link">
                See the run as it is now
              </Link>{' '}
              (a new tab), then keep your changes on top of it, or leave this page.
            </p>
          </Notice>
        ) : failure ? (
          <Notice kind="fails" title="Nothing was kept" live>
            {failure}
          </Notice>
        ) : null}
        <Button type="submit" variant="primary" busy={busy} disabledReason={disabledReason}>
          {newer ? 'Keep my changes on top' : 'Keep the changes'}
        </Button>
      </div>
    </form>
  );
}
