import { StateMark } from '@/components/states/state-mark';
import { DefinitionList } from '@/components/ui/definition-list';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';
import { formatPressure } from '@/lib/units/pressure';

/** Refractometer readings, the newest first; the newest is the one that is judged. */
export function SheetRefractive({ readings }: { readings: FractionSheet['refractiveReadings'] }) {
  if (readings.length === 0) return <p className="text-ink-soft">No refractometer reading yet.</p>;
  return (
    <ul className="flex flex-col gap-4">
      {readings.map((reading, at) => (
        <li key={reading.id} className="rounded border border-line bg-paper-raised px-4 py-3">
          <p className="mb-1 flex flex-wrap items-center gap-2">
            <StateMark state={reading.state} size="sm" />
            <span className="text-sm text-ink-soft">
              {at === 0 ? 'judged' : 'earlier'}; {reading.readBy},{' '}
              {reading.createdAt.slice(0, 16).replace('T', ' ')} UTC
            </span>
          </p>
          <DefinitionList
            columns={2}
            items={[
              {
                term: `Mean of ${reading.readings.length}`,
                value: reading.meanN.toFixed(4),
                condition: `at ${reading.temperatureC.toFixed(1)} °C, ${reading.wavelengthNm} nm`,
              },
              {
                term: 'Corrected',
                value: reading.correctedN?.toFixed(4) ?? null,
                condition: reading.atTemperatureC === null ? null : `at ${reading.atTemperatureC} °C`,
              },
              {
                term: 'Literature',
                value: reading.literature?.n.toFixed(4) ?? null,
                condition: reading.literature ? `at ${reading.literature.temperatureC} °C` : null,
                source: reading.literature?.source,
              },
              {
                term: 'Difference',
                value: reading.difference?.toFixed(4) ?? null,
                condition:
                  reading.expandedUncertainty === null ? null : `± ${reading.expandedUncertainty.toFixed(4)}`,
              },
            ]}
          />
        </li>
      ))}
    </ul>
  );
}

/** Head temperatures against the boiling point expected at the recorded pressure. */
export function SheetBoilingRange({ range }: { range: FractionSheet['boilingRange'] }) {
  const value = (number: number | null) => number?.toFixed(1) ?? null;
  return (
    <div className="rounded border border-line bg-paper-raised px-4 py-3">
      <StateMark state={range.state} size="sm" />
      <p className="my-1">{range.reason}</p>
      <DefinitionList
        columns={2}
        items={[
          {
            term: 'Head temperature',
            value:
              range.lowC === null || range.highC === null
                ? null
                : `${value(range.lowC)} to ${value(range.highC)}`,
            unit: '°C',
            condition:
              range.pressureMbar === null
                ? 'pressure not recorded'
                : `at ${formatPressure(range.pressureMbar)}`,
          },
          {
            term: 'Expected',
            value: value(range.expectedC),
            unit: '°C',
            condition: range.uncertaintyC === null ? null : `± ${value(range.uncertaintyC)} °C, all errors`,
            source: range.source,
          },
        ]}
      />
      {range.notes.map((note) => (
        <p key={note} className="mt-1 text-sm text-ink-soft">
          {note}
        </p>
      ))}
    </div>
  );
}
