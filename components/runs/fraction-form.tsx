'use client';
import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { Textarea } from '@/components/ui/textarea';
import { sayDone } from '@/components/ui/toaster';
import type { FractionJson } from '@/lib/distillation/fraction-schema';
import { api } from '@/lib/http/client';
import { formatMass } from '@/lib/units/mass';
import { CutChoice } from './cut-choice';
import { fractionFormOf, type FractionFormState, readFractionForm } from './fraction-form-state';
import { FormPart } from './form-part';
import { PressureField } from './pressure-field';
import { failureOf, focusFirstProblem, problemsOf } from './problems-of';
import type { Problems } from './read-form';
import { type ChosenPressureUnit, usePressureUnit } from './use-pressure-unit';

type FractionFormProps = {
  runCode: string;
  /** Null to start a new one. */
  fraction: FractionJson | null;
  disabledReason: string | null;
};

/** Starts a fraction, or weighs and corrects one. Made for a phone at the hood. */
export function FractionForm(props: FractionFormProps) {
  const [unit] = usePressureUnit();
  // A new key when the unit changes, so that a kept pressure is shown in the unit that stands beside it.
  return <Form key={unit} unit={unit} {...props} />;
}

function Form({ runCode, fraction, disabledReason, unit }: FractionFormProps & { unit: ChosenPressureUnit }) {
  const router = useRouter();
  const [state, setState] = useState<FractionFormState>(() => fractionFormOf(fraction, unit));
  const [problems, setProblems] = useState<Problems>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const { body } = readFractionForm(state, unit, fraction);
  const signed = fraction?.status === 'signed off';
  const net = body.tareMassG !== null && body.grossMassG !== null ? body.grossMassG - body.tareMassG : null;

  const text = (name: Exclude<keyof FractionFormState, 'cut'>) => ({
    value: state[name],
    onChange: (event: { target: { value: string } }) => {
      const { value } = event.target;
      setState((before) => ({ ...before, [name]: value }));
    },
  });

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy || disabledReason) return;
    const read = readFractionForm(state, unit, fraction);
    const missing: Problems =
      signed && !state.reason.trim() ? { reason: 'Say why a signed-off fraction must change.' } : {};
    setProblems({ ...read.problems, ...missing });
    setFailure(null);
    if (!read.fine || missing.reason) {
      setFailure('Some fields need another look: they are marked.');
      return focusFirstProblem(event.currentTarget);
    }
    setBusy(true);
    try {
      const kept = fraction
        ? await api<FractionJson>(`/api/v1/fractions/${fraction.code}`, {
            method: 'PATCH',
            json: read.body,
            version: fraction.version,
          })
        : await api<FractionJson>(`/api/v1/runs/${runCode}/fractions`, { json: read.body });
      sayDone(fraction ? `${kept.code} is kept.` : `${kept.code} is started.`);
      router.push(fraction ? `/fractions/${kept.code}` : `/runs/${runCode}`);
      router.refresh();
    } catch (error) {
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
      setBusy(false);
    }
  }

  return (
    <form onSubmit={submit} noValidate className="flex max-w-form flex-col gap-6">
      <CutChoice
        value={state.cut}
        error={problems.cut}
        onChange={(cut) => setState((before) => ({ ...before, cut }))}
      />
      <FormPart title="Receiver">
        <div className="grid grid-cols-2 gap-3">
          <NumberField label="Tare" unit="g" hint="empty" error={problems.tareMassG} {...text('tare')} />
          <NumberField
            label="Gross"
            unit="g"
            hint="when it is full"
            error={problems.grossMassG}
            {...text('gross')}
          />
        </div>
        <p role="status" className="font-bold">
          {net !== null && net >= 0 ? `Net ${formatMass(net)}` : ''}
        </p>
      </FormPart>
      <FormPart title="At the head">
        <div className="grid grid-cols-2 gap-3">
          <NumberField
            label="From"
            unit="°C"
            signed
            hint="first drop"
            error={problems.headTemperatureFromC}
            {...text('headFrom')}
          />
          <NumberField
            label="To"
            unit="°C"
            signed
            hint="last drop"
            error={problems.headTemperatureToC}
            {...text('headTo')}
          />
        </div>
        <PressureField
          label="Pressure"
          hint="Absolute, as read. Without it the boiling range cannot be judged."
          value={state.pressure}
          error={problems.pressureMbar}
          onChange={(pressure) => setState((before) => ({ ...before, pressure }))}
        />
      </FormPart>
      <FormPart title="Content">
        <Field
          label="Appearance"
          optional
          hint="clear, colourless, cloudy, two layers"
          error={problems.appearance}
          {...text('appearance')}
        />
        <Field label="Storage place" optional error={problems.storagePlace} {...text('storagePlace')} />
      </FormPart>
      {signed ? (
        <Textarea
          label="Reason for the change"
          hint="This fraction is signed off: the change ends its signature, which stays readable."
          error={problems.reason}
          {...text('reason')}
        />
      ) : null}
      {failure ? (
        <Notice kind="fails" title="Nothing was kept" live>
          {failure}
        </Notice>
      ) : null}
      <Button
        type="submit"
        variant="primary"
        busy={busy}
        disabledReason={disabledReason}
        className="min-h-14 w-full"
      >
        {fraction ? 'Keep the changes' : 'Start the fraction'}
      </Button>
    </form>
  );
}
