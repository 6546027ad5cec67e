'use client';
import { useState, type FormEvent } from 'react';
import { searchCompounds } from '@/components/runs/compound-search';
import { PressureField } from '@/components/runs/pressure-field';
import { FormReader } from '@/components/runs/read-form';
import { usePressureUnit } from '@/components/runs/use-pressure-unit';
import { Button } from '@/components/ui/button';
import { Combobox } from '@/components/ui/combobox';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import type { SeparationJson } from '@/lib/distillation/planner/schema';
import { SeparationAnswer } from './separation-answer';
import { useAnswer } from './use-answer';

/** How well two liquids part at a pressure. */
export function SeparationForm() {
  const [unit] = usePressureUnit();
  const [light, setLight] = useState<string | null>(null);
  const [heavy, setHeavy] = useState<string | null>(null);
  const [texts, setTexts] = useState({
    pressure: '',
    lightPurity: '95',
    heavyPurity: '95',
    bathTemperatureC: '',
  });
  const set = (part: Partial<typeof texts>) => setTexts((now) => ({ ...now, ...part }));
  const { answer, problems, failure, busy, ask, refuse } = useAnswer<SeparationJson>(
    '/api/v1/compute/separation',
  );

  function submit(event: FormEvent) {
    event.preventDefault();
    const reader = new FormReader();
    const pressureMbar = reader.pressureMbar('pressureMbar', texts.pressure, unit);
    const lightPercent = reader.number('lightPurity', texts.lightPurity);
    const heavyPercent = reader.number('heavyPurity', texts.heavyPurity);
    const bathTemperatureC = reader.temperatureC('bathTemperatureC', texts.bathTemperatureC);
    reader.require('light', light !== null, 'Choose the compound that boils lower.');
    reader.require('heavy', heavy !== null, 'Choose the compound that boils higher.');
    reader.require('pressureMbar', pressureMbar !== null, 'Give the absolute pressure in the still.');
    if (!reader.fine) return refuse(reader.problems);
    void ask({
      light,
      heavy,
      pressureMbar,
      ...(lightPercent !== null && { lightPurity: lightPercent / 100 }),
      ...(heavyPercent !== null && { heavyPurity: heavyPercent / 100 }),
      ...(bathTemperatureC !== null && { bathTemperatureC }),
    });
  }

  return (
    <div className="grid gap-6 lg:grid-cols-2">
      <form noValidate onSubmit={submit} className="flex max-w-form flex-col gap-4">
        {failure ? <Notice kind="fails" live title={failure} /> : null}
        <Combobox
          label="Boils lower"
          search={searchCompounds}
          onChoose={(option) => setLight(option?.value ?? null)}
          error={problems.light}
        />
        <Combobox
          label="Boils higher"
          search={searchCompounds}
          onChoose={(option) => setHeavy(option?.value ?? null)}
          error={problems.heavy}
        />
        <PressureField
          label="Pressure"
          hint="absolute, in the still"
          value={texts.pressure}
          onChange={(pressure) => set({ pressure })}
          error={problems.pressureMbar}
        />
        <div className="grid gap-4 sm:grid-cols-2">
          <NumberField
            label="Wanted in the distillate"
            unit="mol %"
            hint="of the lower one"
            value={texts.lightPurity}
            onChange={(event) => set({ lightPurity: event.target.value })}
            error={problems.lightPurity}
          />
          <NumberField
            label="Wanted in the still"
            unit="mol %"
            hint="of the higher one"
            value={texts.heavyPurity}
            onChange={(event) => set({ heavyPurity: event.target.value })}
            error={problems.heavyPurity}
          />
        </div>
        <NumberField
          label="Bath or mantle"
          unit="°C"
          optional
          hint="its hottest surface, for the cautions"
          value={texts.bathTemperatureC}
          onChange={(event) => set({ bathTemperatureC: event.target.value })}
          error={problems.bathTemperatureC}
        />
        <div>
          <Button variant="primary" type="submit" busy={busy}>
            Plan the separation
          </Button>
        </div>
      </form>
      {answer ? <SeparationAnswer answer={answer} /> : null}
    </div>
  );
}
