'use client';
import { useState, type FormEvent } from 'react';
import { FormReader } from '@/components/runs/read-form';
import {
  PRESSURE_UNITS,
  usePressureUnit,
  type ChosenPressureUnit,
} from '@/components/runs/use-pressure-unit';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import type { BoilingPressureJson } from '@/lib/distillation/planner/schema';
import { formatPressure } from '@/lib/units/pressure';
import { AnswerCard } from './answer-card';
import { LiquidFields, noLiquid } from './liquid-fields';
import { readLiquid } from './read-liquid';
import { useAnswer } from './use-answer';

/** What pressure a liquid needs to boil at a wanted temperature. */
export function PressureForm() {
  const [unit, chooseUnit] = usePressureUnit();
  const [liquid, setLiquid] = useState(noLiquid);
  const [temperature, setTemperature] = useState('');
  const { answer, problems, failure, busy, ask, refuse } = useAnswer<BoilingPressureJson>(
    '/api/v1/compute/boiling-pressure',
  );

  function submit(event: FormEvent) {
    event.preventDefault();
    const reader = new FormReader();
    const body = {
      ...readLiquid(reader, liquid),
      temperatureC: reader.temperatureC('temperatureC', temperature),
    };
    reader.require(
      'temperatureC',
      body.temperatureC !== null,
      'Give the temperature at which it shall boil.',
    );
    if (reader.fine) void ask(body);
    else refuse(reader.problems);
  }

  return (
    <div className="grid gap-6 lg:grid-cols-2">
      <form noValidate onSubmit={submit} className="flex max-w-form flex-col gap-4">
        {failure ? <Notice kind="fails" live title={failure} /> : null}
        <LiquidFields liquid={liquid} onChange={setLiquid} problems={problems} />
        <NumberField
          label="Wanted boiling temperature"
          unit="°C"
          signed
          value={temperature}
          onChange={(event) => setTemperature(event.target.value)}
          error={problems.temperatureC}
        />
        <Select
          label="Answer in"
          value={unit}
          onChange={(event) => chooseUnit(event.target.value as ChosenPressureUnit)}
          options={PRESSURE_UNITS.map((value) => ({ value, label: value }))}
        />
        <div>
          <Button variant="primary" type="submit" busy={busy}>
            Work out the pressure
          </Button>
        </div>
      </form>
      {answer ? (
        <AnswerCard
          figure={formatPressure(answer.pressureMbar, unit)}
          doubt={`${formatPressure(answer.pressureLowMbar, unit)} to ${formatPressure(answer.pressureHighMbar, unit)}, about 95 %`}
          of={`${answer.liquid} boils at ${answer.temperatureC.toFixed(1)} °C under`}
          method={answer.methodName}
          source={answer.source}
          notes={answer.notes}
        />
      ) : null}
    </div>
  );
}
