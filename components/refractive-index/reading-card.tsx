import { LocalTime } from '@/components/runs/local-time';
import { StateMark } from '@/components/states/state-mark';
import { DataTable } from '@/components/ui/data-table';
import { DefinitionList } from '@/components/ui/definition-list';
import type { RefractiveReadingJson } from '@/lib/evidence/refractive-index/schema';

const signed = (value: number, digits = 4) => `${value < 0 ? '−' : '+'}${Math.abs(value).toFixed(digits)}`;

type ReadingCardProps = { reading: RefractiveReadingJson; /** The newest one is judged. */ judged?: boolean };

/** What the server made of a set of readings: comparison, water check, what it could see, and the budget behind U. */
export function ReadingCard({ reading, judged = false }: ReadingCardProps) {
  const { literature } = reading;
  return (
    <article className="rounded border border-line bg-paper-raised px-4 py-3">
      <header className="mb-2 flex flex-wrap items-center gap-x-3 gap-y-1">
        <StateMark state={reading.state} />
        <span className="text-sm text-ink-soft">
          {judged ? 'the latest, which is judged' : 'an earlier one'}; {reading.readBy},{' '}
          <LocalTime at={reading.createdAt} />
        </span>
      </header>
      <p className="mb-2 max-w-prose">{reading.reason}</p>
      <DefinitionList
        columns={2}
        items={[
          {
            term: `Mean of ${reading.readings.length}`,
            value: reading.meanN.toFixed(4),
            condition: `at ${reading.temperatureC.toFixed(1)} °C, ${reading.wavelengthNm} nm`,
            source: reading.readings.map((n) => n.toFixed(4)).join(', '),
          },
          {
            term: 'Corrected',
            value: reading.correctedN?.toFixed(4) ?? null,
            condition: reading.atTemperatureC === null ? null : `at ${reading.atTemperatureC} °C`,
            source: `${reading.fallPerC} per °C, ${reading.fallSource}`,
          },
          {
            term: 'Literature',
            value: literature?.n.toFixed(4) ?? null,
            condition: literature && `at ${literature.temperatureC} °C`,
            source: literature?.source,
          },
          {
            term: 'Difference',
            value: reading.difference === null ? null : signed(reading.difference, 5),
            condition:
              reading.expandedUncertainty === null
                ? null
                : `U ${reading.expandedUncertainty.toFixed(5)}, k = ${reading.coverageFactor}`,
          },
          {
            term: 'Tolerance',
            value: `± ${reading.tolerance}`,
            condition: `${reading.decisionRule} acceptance`,
            source: reading.toleranceSource,
          },
          {
            term: 'Water check',
            value: reading.waterCheck ? signed(reading.waterCheck.offset) : null,
            condition: reading.waterCheck?.state,
            source: reading.waterCheck?.reason,
          },
        ]}
      />
      {reading.notes.map((note) => (
        <p key={note} className="mt-2 text-sm text-ink-soft">
          {note}
        </p>
      ))}
      {reading.smallestVisible.length > 0 ? <Visible reading={reading} /> : null}
      {reading.budget.length > 0 ? <Budget reading={reading} /> : null}
    </article>
  );
}

function Visible({ reading }: { reading: RefractiveReadingJson }) {
  return (
    <section className="mt-4" aria-label="What this test can see">
      <h3 className="font-bold">The least of each known impurity that it could see</h3>
      <ul>
        {reading.smallestVisible.map(({ compound, state, volumePercent, reason }) => (
          <li key={compound.id} className="border-b border-line py-2">
            <span className="flex flex-wrap items-center justify-between gap-2">
              <span className="font-bold">{compound.name}</span>
              {state === 'unknown' ? (
                <span className="text-ink-soft">not known</span>
              ) : (
                <StateMark
                  state={state}
                  size="sm"
                  detail={volumePercent === null ? undefined : `${volumePercent.toPrecision(2)} vol %`}
                />
              )}
            </span>
            <span className="block text-sm text-ink-soft">{reason}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

function Budget({ reading }: { reading: RefractiveReadingJson }) {
  return (
    <details className="mt-4">
      <summary className="min-h-target py-3 font-bold text-glass">Where U comes from</summary>
      <DataTable
        caption="Standard uncertainties of n, k = 1 (JCGM 100:2008); U is twice the root of the sum of their squares."
        columns={[
          { key: 'source', header: 'Source', rowHeader: true, cell: (row: Row) => row.source },
          { key: 'type', header: 'Type', cell: (row) => row.type },
          { key: 'distribution', header: 'Distribution', cell: (row) => row.distribution },
          { key: 'u', header: 'u', numeric: true, cell: (row) => row.standardUncertainty.toFixed(6) },
          { key: 'basis', header: 'From', cell: (row) => row.basis },
        ]}
        rows={reading.budget}
        rowKey={(row) => row.source}
      />
      <p className="mt-2 text-sm text-ink-soft">Method {reading.methodVersion}</p>
    </details>
  );
}
type Row = RefractiveReadingJson['budget'][number];
