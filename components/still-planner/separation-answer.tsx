import { CautionsList } from '@/components/runs/cautions-list';
import { DefinitionList } from '@/components/ui/definition-list';
import type { SeparationJson } from '@/lib/distillation/planner/schema';

/** What the separation of two liquids comes to. */
export function SeparationAnswer({ answer }: { answer: SeparationJson }) {
  const boils = (side: SeparationJson['light']) => ({
    term: `${side.liquid} boils at`,
    value: side.boilingPointC.toFixed(1),
    unit: '°C',
    condition: `± ${side.uncertaintyC.toFixed(1)} °C`,
    source: `${side.methodName}; ${side.source}`,
  });
  return (
    <div role="status" className="flex flex-col gap-4">
      <div className="rounded border border-line bg-paper-raised px-4 py-4">
        <p className="text-xl font-bold">{answer.advice}</p>
        <p className="mb-3 text-sm text-ink-soft">{answer.adviceBasis}</p>
        <DefinitionList
          items={[
            boils(answer.light),
            boils(answer.heavy),
            { term: 'Apart by', value: answer.differenceC.toFixed(1), unit: '°C' },
            {
              term: 'Relative volatility',
              value: answer.relativeVolatility.toFixed(2),
              condition: `at ${answer.meanTemperatureC.toFixed(1)} °C, ideal mixture`,
              source: 'ratio of the vapour pressures',
            },
            {
              term: 'Least theoretical stages',
              value: answer.minimumStages.toFixed(1),
              condition: 'at total reflux; the still counts as one',
              source: 'Fenske (1932)',
            },
          ]}
        />
        <p className="mt-3 font-bold">Azeotropes</p>
        {answer.azeotropes.length === 0 ? (
          <p>None of this pair is in our table, which is not a proof that there is none.</p>
        ) : (
          <ul className="list-disc pl-5">
            {answer.azeotropes.map((known) => (
              <li key={known.boilingPointC}>
                {known.lightMassPercent} % {answer.light.liquid} and {known.heavyMassPercent} %{' '}
                {answer.heavy.liquid} by mass, {known.boilingPointC} °C at {known.pressureKPa} kPa (
                {known.kind} boiling{known.twoLayers ? ', two layers' : ''}).
                <span className="block text-sm text-ink-soft">{known.source}</span>
              </li>
            ))}
          </ul>
        )}
        {answer.notes.map((note) => (
          <p key={note} className="mt-2 text-sm text-ink-soft">
            {note}
          </p>
        ))}
      </div>
      <CautionsList cautions={answer.cautions} />
    </div>
  );
}
