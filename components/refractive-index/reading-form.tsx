'use client';
import { useState, type FormEvent } from 'react';
import { failureOf } from '@/components/runs/problems-of';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import type { RefractiveReadingJson } from '@/lib/evidence/refractive-index/schema';
import { api, ApiError } from '@/lib/http/client';
import { emptyReadingTexts, readReadingTexts } from './reading-texts';

type ReadingFormProps = {
  fractionCode: string;
  disabledReason: string | null;
  onSaved: (reading: RefractiveReadingJson) => void;
};

/** Refractometer readings as they are typed at the bench: several of one sample, temperature, water check. */
export function ReadingForm({ fractionCode, disabledReason, onSaved }: ReadingFormProps) {
  const [texts, setTexts] = useState(emptyReadingTexts);
  const [problems, setProblems] = useState<Record<string, string>>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const set = (part: Partial<typeof texts>) => setTexts((now) => ({ ...now, ...part }));
  const setReading = (at: number, text: string) =>
    set({ readings: texts.readings.map((reading, k) => (k === at ? text : reading)) });

  async function send(event: FormEvent) {
    event.preventDefault();
    if (busy || disabledReason) return;
    const read = readReadingTexts(texts);
    setProblems(read.problems);
    setFailure(null);
    if (!read.body) return;
    setBusy(true);
    try {
      const path = `/api/v1/fractions/${encodeURIComponent(fractionCode)}/refractive-readings`;
      onSaved(await api<RefractiveReadingJson>(path, { json: read.body }));
      // Instrument and water check hold for the next sample too.
      set({ readings: emptyReadingTexts.readings });
    } catch (error) {
      setFailure(failureOf(error));
      if (error instanceof ApiError)
        setProblems(Object.fromEntries(error.errors.map(({ path, message }) => [path, message])));
    } finally {
      setBusy(false);
    }
  }

  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex max-w-form flex-col gap-5">
      {failure ? <Notice kind="fails" live title={failure} /> : null}
      <fieldset className="flex flex-col gap-3">
        <legend className="mb-1 font-bold">Readings of the sample</legend>
        <div className="grid grid-cols-2 gap-3 sm:grid-cols-3">
          {texts.readings.map((text, at) => (
            <NumberField
              key={at}
              label={`n ${at + 1}`}
              optional={at > 0}
              value={text}
              onChange={(event) => setReading(at, event.target.value)}
              error={problems[`readings.${at}`] ?? (at === 0 ? problems.readings : undefined)}
            />
          ))}
        </div>
        <p className="text-sm text-ink-soft">
          Read at least three times, with a fresh drop each: one reading says nothing about repeatability.
        </p>
        <div>
          <Button onClick={() => set({ readings: [...texts.readings, ''] })}>One more reading</Button>
        </div>
      </fieldset>
      <NumberField
        label="Temperature of the prism"
        unit="°C"
        signed
        value={texts.temperatureC}
        onChange={(event) => set({ temperatureC: event.target.value })}
        error={problems.temperatureC}
        required
      />
      <fieldset className="grid grid-cols-1 gap-3 sm:grid-cols-2">
        <legend className="mb-1 font-bold">
          Water check <span className="font-normal text-ink-soft">(recommended)</span>
        </legend>
        <NumberField
          label="Pure water reads"
          hint="1.3330 at 20 °C, 1.3325 at 25 °C (Ph. Eur. 2.2.6)"
          value={texts.waterReading}
          onChange={(event) => set({ waterReading: event.target.value })}
          error={problems.waterReading}
        />
        <NumberField
          label="Temperature of the water"
          unit="°C"
          hint="left empty: as the sample"
          value={texts.waterTemperatureC}
          onChange={(event) => set({ waterTemperatureC: event.target.value })}
          error={problems.waterTemperatureC}
        />
      </fieldset>
      <Field
        label="Refractometer"
        optional
        hint="its name or number"
        value={texts.instrument}
        onChange={(event) => set({ instrument: event.target.value })}
        error={problems.instrument}
      />
      <NumberField
        label="Wavelength"
        unit="nm"
        hint="Only the sodium D line, 589.3 nm, can be compared with the literature."
        value={texts.wavelengthNm}
        onChange={(event) => set({ wavelengthNm: event.target.value })}
        error={problems.wavelengthNm}
      />
      <div>
        <Button variant="primary" type="submit" busy={busy} disabledReason={disabledReason}>
          Save and compare
        </Button>
      </div>
    </form>
  );
}
