'use client';

import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { sayDone } from '@/components/ui/toaster';
import { api, ApiError } from '@/lib/http/client';
import { readRefractive, type RefractiveTexts } from './read-refractive';

const empty: RefractiveTexts = {
  readings: '',
  temperatureC: '',
  waterReading: '',
  waterTemperatureC: '',
  instrument: '',
};

/** Enters refractometer readings; the server corrects and compares them. */
export function SheetRefractiveForm({
  fractionCode,
  whyNot,
}: {
  fractionCode: string;
  whyNot: string | null;
}) {
  const router = useRouter();
  const [texts, setTexts] = useState(empty);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const field = (name: keyof RefractiveTexts) => ({
    value: texts[name],
    onChange: (event: { target: { value: string } }) => setTexts({ ...texts, [name]: event.target.value }),
  });

  async function send(event: FormEvent) {
    event.preventDefault();
    const read = readRefractive(texts);
    setProblem(read.problem);
    if (read.problem) return;
    setBusy(true);
    try {
      await api(`/api/v1/fractions/${encodeURIComponent(fractionCode)}/refractive-readings`, {
        json: read.body,
      });
      setTexts(empty);
      sayDone('Readings entered and compared');
      router.refresh();
    } catch (error) {
      setProblem(error instanceof ApiError ? error.detail : 'That did not work. Try again.');
    } finally {
      setBusy(false);
    }
  }
  return (
    <form onSubmit={send} noValidate className="mt-3 flex flex-col gap-3 no-print">
      <div className="grid gap-3 sm:grid-cols-2">
        <Field
          label="Readings"
          hint="Three or more, with a space between them."
          inputMode="text"
          autoComplete="off"
          {...field('readings')}
        />
        <NumberField label="Prism temperature" unit="°C" {...field('temperatureC')} />
        <NumberField label="Water reads" optional {...field('waterReading')} />
        <NumberField label="Water temperature" optional unit="°C" {...field('waterTemperatureC')} />
        <Field label="Refractometer" optional {...field('instrument')} />
      </div>
      {problem ? (
        <Notice kind="fails" title="Not entered" live>
          {problem}
        </Notice>
      ) : null}
      <div>
        <Button type="submit" busy={busy} disabledReason={whyNot}>
          Enter readings
        </Button>
      </div>
    </form>
  );
}
