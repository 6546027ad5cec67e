'use client';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import type { TracePreviewJson } from '@/lib/evidence/gc/schema';
import { delimiterText, timeUnitText } from './trace-facts';

/** What a person says about the table; an empty text leaves it to be detected. */
export type ReadChoices = {
  delimiter: string;
  decimal: string;
  timeUnit: string;
  timeColumn: string;
  signalColumn: string;
  samplingHz: string;
};
export const nothingChosen: ReadChoices = {
  delimiter: '',
  decimal: '',
  timeUnit: '',
  timeColumn: '',
  signalColumn: '',
  samplingHz: '',
};

/** The choices as the API takes them. */
export function readOf(choices: ReadChoices): Record<string, string | number> {
  const read: Record<string, string | number> = {};
  for (const key of ['delimiter', 'decimal', 'timeUnit'] as const) if (choices[key]) read[key] = choices[key];
  for (const key of ['timeColumn', 'signalColumn'] as const)
    if (choices[key]) read[key] = Number(choices[key]);
  const rate = Number(choices.samplingHz.replace(',', '.'));
  if (choices.samplingHz.trim() !== '' && Number.isFinite(rate)) read.samplingHz = rate;
  return read;
}

type ReadFactsProps = {
  /** Null while the file cannot be read. */
  detected: TracePreviewJson['detected'] | null;
  choices: ReadChoices;
  onChange: (choices: ReadChoices) => void;
  problems: Record<string, string>;
};

/** How the file is read: what was detected stands as the first choice of each field, and each can be overruled. */
export function ReadFacts({ detected, choices, onChange, problems }: ReadFactsProps) {
  const set = (part: Partial<ReadChoices>) => onChange({ ...choices, ...part });
  const found = (text: string | null | undefined) => (text ? `detected: ${text}` : 'detect it');
  const columns = (detected?.columns ?? []).map((name, at) => ({
    value: String(at),
    label: `${at + 1}: ${name}`,
  }));
  const named = (at: number | null | undefined) =>
    at === null || at === undefined ? null : detected?.columns[at];
  return (
    <fieldset className="grid gap-4 sm:grid-cols-2">
      <legend className="mb-2 font-bold">How the file is read</legend>
      <Select
        label="Between columns"
        value={choices.delimiter}
        onChange={(event) => set({ delimiter: event.target.value })}
        placeholder={found(detected && delimiterText(detected.delimiter))}
        options={[',', ';', 'tab', 'space', '|'].map((value) => ({ value, label: delimiterText(value) }))}
        error={problems['read.delimiter']}
      />
      <Select
        label="Decimal sign"
        value={choices.decimal}
        onChange={(event) => set({ decimal: event.target.value })}
        placeholder={found(detected && (detected.decimal === ',' ? 'comma' : 'point'))}
        options={[
          { value: '.', label: 'point' },
          { value: ',', label: 'comma' },
        ]}
        error={problems['read.decimal']}
      />
      <Select
        label="Unit of time"
        value={choices.timeUnit}
        onChange={(event) => set({ timeUnit: event.target.value })}
        placeholder={found(detected && timeUnitText(detected))}
        options={[
          { value: 'min', label: 'minutes' },
          { value: 's', label: 'seconds' },
          { value: 'ms', label: 'milliseconds' },
          { value: 'h', label: 'hours' },
        ]}
        hint={
          detected?.timeUnitFrom === 'assumed'
            ? 'The file does not say: it is assumed from the length. Please choose it.'
            : undefined
        }
        error={problems['read.timeUnit']}
      />
      <NumberField
        label="Sampling rate"
        unit="points/s"
        optional
        hint="only for a file without times"
        value={choices.samplingHz}
        onChange={(event) => set({ samplingHz: event.target.value })}
        error={problems['read.samplingHz']}
      />
      <Select
        label="Column of times"
        value={choices.timeColumn}
        onChange={(event) => set({ timeColumn: event.target.value })}
        placeholder={found(named(detected?.timeColumn))}
        options={columns}
        error={problems['read.timeColumn']}
      />
      <Select
        label="Column of the signal"
        value={choices.signalColumn}
        onChange={(event) => set({ signalColumn: event.target.value })}
        placeholder={found(named(detected?.signalColumn))}
        options={columns}
        error={problems['read.signalColumn']}
      />
    </fieldset>
  );
}
