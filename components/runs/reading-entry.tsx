'use client';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { sayDone } from '@/components/ui/toaster';
import { api } from '@/lib/http/client';
import { PressureField } from './pressure-field';
import { failureOf, problemsOf } from './problems-of';
import { FormReader, type Problems } from './read-form';
import { usePressureUnit } from './use-pressure-unit';

const empty = { head: '', pressure: '', bath: '', volume: '', note: '' };
type Typed = typeof empty;

/** One log reading, taken now: head temperature, pressure, save. The rest is there for who wants it. */
export function ReadingEntry({ runCode, onAdded }: { runCode: string; onAdded: () => void }) {
  const [unit] = usePressureUnit();
  const [typed, setTyped] = useState<Typed>(empty);
  const [problems, setProblems] = useState<Problems>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const set = (name: keyof Typed) => (event: { target: { value: string } }) => {
    const { value } = event.target;
    setTyped((before) => ({ ...before, [name]: value }));
  };

  async function save(event: FormEvent) {
    event.preventDefault();
    if (busy) return;
    const read = new FormReader();
    const reading = {
      at: new Date().toISOString(),
      headTemperatureC: read.temperatureC('headTemperatureC', typed.head),
      pressureMbar: read.pressureMbar('pressureMbar', typed.pressure, unit),
      bathTemperatureC: read.temperatureC('bathTemperatureC', typed.bath),
      volumeMl: read.number('volumeMl', typed.volume),
      note: typed.note.trim() || null,
    };
    const { at: _, ...values } = reading;
    read.require(
      'headTemperatureC',
      Object.values(values).some((value) => value !== null),
      'Enter at least one value.',
    );
    setProblems(read.problems);
    setFailure(null);
    if (!read.fine) return;
    setBusy(true);
    try {
      await api(`/api/v1/runs/${runCode}/readings`, { json: { readings: [reading] } });
      // The pressure rarely changes between two readings, so it stays for the next one.
      setTyped({ ...empty, pressure: typed.pressure });
      sayDone('Reading kept.');
      onAdded();
    } catch (error) {
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
    } finally {
      setBusy(false);
    }
  }

  return (
    <form onSubmit={save} noValidate className="flex flex-col gap-3">
      <div className="grid gap-3 sm:grid-cols-2">
        <NumberField
          label="Head temperature"
          unit="°C"
          signed
          value={typed.head}
          error={problems.headTemperatureC}
          onChange={set('head')}
        />
        <PressureField
          label="Pressure"
          optional
          value={typed.pressure}
          error={problems.pressureMbar}
          onChange={(pressure) => setTyped((before) => ({ ...before, pressure }))}
        />
      </div>
      <details>
        <summary className="flex min-h-target w-fit items-center text-glass underline underline-offset-4">
          Bath, volume, note
        </summary>
        <div className="grid gap-3 pt-2 sm:grid-cols-2">
          <NumberField
            label="Bath temperature"
            optional
            unit="°C"
            signed
            value={typed.bath}
            error={problems.bathTemperatureC}
            onChange={set('bath')}
          />
          <NumberField
            label="Collected so far"
            optional
            unit="mL"
            value={typed.volume}
            error={problems.volumeMl}
            onChange={set('volume')}
          />
          <Field
            label="Note"
            optional
            className="sm:col-span-2"
            value={typed.note}
            error={problems.note}
            onChange={set('note')}
          />
        </div>
      </details>
      {failure && Object.keys(problems).length === 0 ? (
        <Notice kind="fails" title="The reading was not kept" live>
          {failure}
        </Notice>
      ) : null}
      <Button type="submit" variant="primary" busy={busy} className="min-h-14 sm:w-fit">
        Keep this reading
      </Button>
    </form>
  );
}
