'use client';
import { useState, type FormEvent } from 'react';
import { PressureField } from '@/components/runs/pressure-field';
import { FormReader } from '@/components/runs/read-form';
import { usePressureUnit } from '@/components/runs/use-pressure-unit';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { BoilingPointJson } from '@/lib/distillation/planner/schema';
import { formatPressure } from '@/lib/units/pressure';
import { AnswerCard } from './answer-card';
import { LiquidFields, noLiquid } from './liquid-fields';
import { readLiquid } from './read-liquid';
import { useAnswer } from './use-answer';

/** At what temperature a liquid boils at a pressure. */
export function BoilingPointForm() {
  const [unit] = usePressureUnit();
  const [liquid, setLiquid] = useState(noLiquid);
  const [pressure, setPressure] = useState('');
  const { answer, problems, failure, busy, ask, refuse } = useAnswer<BoilingPointJson>(
    '/api/v1/compute/boiling-point',
  );

  function submit(event: FormEvent) {
    event.preventDefault();
    const reader = new FormReader();
    const body = {
      ...readLiquid(reader, liquid),
      pressureMbar: reader.pressureMbar('pressureMbar', pressure, unit),
    };
    reader.require('pressureMbar', body.pressureMbar !== null, 'Give the absolute pressure in the still.');
    if (reader.fine) void ask(body);
    else refuse(reader.problems);
  }

  return (
    <div className="grid gap-6 lg:grid-cols-2">
      <form noValidate onSubmit={submit} className="flex max-w-form flex-col gap-4">
        {failure ? <Notice kind="fails" live title={failure} /> : null}
        <LiquidFields liquid={liquid} onChange={setLiquid} problems={problems} />
        <PressureField
          label="Pressure"
          hint="absolute, in the still"
          value={pressure}
          onChange={setPressure}
          error={problems.pressureMbar}
        />
        <div>
          <Button variant="primary" type="submit" busy={busy}>
            Work out the boiling point
          </Button>
        </div>
      </form>
      {answer ? (
        <AnswerCard
          figure={`${answer.boilingPointC.toFixed(1)} °C`}
          doubt={`± ${answer.uncertaintyC.toFixed(1)} °C, about 95 %`}
          of={`${answer.liquid} at ${formatPressure(answer.pressureMbar, unit)} boils at`}
          method={answer.methodName}
          source={answer.source}
          notes={answer.notes}
        />
      ) : null}
    </div>
  );
}
