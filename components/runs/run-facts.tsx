'use client';
import { type Definition, DefinitionList } from '@/components/ui/definition-list';
import type { ExpectedBoiling } from '@/lib/distillation/run-sheet';
import { safetyChecks, type SafetyCheck } from '@/lib/distillation/safety-checks';
import type { RunJson } from '@/lib/distillation/schema';
import { formatMass } from '@/lib/units/mass';
import { formatPressure } from '@/lib/units/pressure';
import { LocalTime } from './local-time';
import { usePressureUnit } from './use-pressure-unit';

/** What is kept of a run, each number with its unit, condition and source. */
export function RunFacts({ run, expected }: { run: RunJson; expected: ExpectedBoiling | null }) {
  const [unit] = usePressureUnit();
  const looked = Object.entries(safetyChecks).filter(([name]) => run.safetyChecks[name as SafetyCheck]);
  const items: Definition[] = [
    {
      term: 'Target',
      value: run.targetCompound.name,
      condition: run.targetCompound.cas ? `CAS ${run.targetCompound.cas}` : undefined,
    },
    {
      term: 'Known impurities',
      value:
        run.knownImpurities.length > 0
          ? run.knownImpurities.map((each) => each.name).join(', ')
          : 'none named',
    },
    {
      term: 'Charge',
      value: formatMass(run.chargeMassG),
      condition: [run.chargeSource, run.chargeLot && `lot ${run.chargeLot}`].filter(Boolean).join(', '),
    },
    {
      term: 'Technique',
      value: run.technique,
      condition: run.columnStages === null ? undefined : `${run.columnStages} theoretical stages`,
    },
    {
      term: 'Planned pressure',
      value: run.plannedPressureMbar === null ? 'of the air' : formatPressure(run.plannedPressureMbar, unit),
    },
    {
      term: 'Expected boiling point',
      value: expected && `${expected.boilingPointC.toFixed(1)} ± ${expected.uncertaintyC.toFixed(1)}`,
      unit: expected ? '°C' : undefined,
      condition: expected && `at ${formatPressure(expected.pressureMbar, unit)}`,
      source: expected?.source,
    },
    {
      term: 'Bath',
      value: run.bath,
      condition: run.bathTemperatureC === null ? undefined : `${run.bathTemperatureC} °C`,
    },
    { term: 'Started', value: <LocalTime at={run.startedAt} /> },
    { term: 'Ended', value: run.endedAt ? <LocalTime at={run.endedAt} /> : 'still running' },
    { term: 'Residue', value: run.residueMassG === null ? 'not weighed yet' : formatMass(run.residueMassG) },
  ];
  return (
    <div className="flex flex-col gap-4">
      <DefinitionList items={items} columns={3} />
      {run.note ? (
        <div>
          <h3 className="font-bold">Note</h3>
          <p className="max-w-prose whitespace-pre-line">{run.note}</p>
        </div>
      ) : null}
      <div>
        <h3 className="font-bold">Looked at before heating</h3>
        {looked.length > 0 ? (
          <ul className="list-disc pl-5 md:columns-2">
            {looked.map(([name, words]) => (
              <li key={name}>{words}</li>
            ))}
          </ul>
        ) : (
          <p className="text-ink-soft">Nothing was ticked.</p>
        )}
      </div>
    </div>
  );
}
