'use client';
import { compoundSearch } from './compound-search';
import { Button } from '@/components/ui/button';
import { Combobox } from '@/components/ui/combobox';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { NumberField } from '@/components/ui/number-field';
import { mayBeDiluted } from './facts';
import type { Lane, Subject } from './marks';

export type RunFraction = { code: string; cut: string };

type LaneEditorProps = {
  lane: Lane;
  number: number;
  fractions: readonly RunFraction[];
  onChange: (change: Partial<Pick<Lane, 'label' | 'subject' | 'dilutionPercent'>>) => void;
  onRemove: () => void;
  selected: boolean;
};

const kinds: { value: NonNullable<Subject['kind']>; label: string }[] = [
  { value: 'fraction', label: 'fraction' },
  { value: 'crude', label: 'crude' },
  { value: 'reference', label: 'reference' },
  { value: 'co-spot', label: 'co-spot (fraction on reference)' },
  { value: 'blank', label: 'blank' },
];

/** A label that says what the lane holds, as long as nobody typed one of their own. */
function labelFor(subject: Subject, before: Lane, number: number): string {
  const own = before.label !== `${number}` && before.label !== labelOf(before.subject);
  return own ? before.label : (labelOf(subject) ?? `${number}`);
}

function labelOf({ kind, code, compound }: Subject): string | null {
  const short = code?.split('-').at(-1);
  if (kind === 'fraction') return short ?? null;
  if (kind === 'reference') return compound?.name.slice(0, 20) ?? 'ref';
  if (kind === 'co-spot') return short ? `${short}+ref` : 'co';
  return kind;
}

/** What was spotted on one lane. */
export function LaneEditor({ lane, number, fractions, onChange, onRemove, selected }: LaneEditorProps) {
  const { subject } = lane;
  const become = (next: Subject) => onChange({ subject: next, label: labelFor(next, lane, number) });
  const withFraction = subject.kind === 'fraction' || subject.kind === 'co-spot';
  const withCompound = subject.kind === 'reference' || subject.kind === 'co-spot';
  return (
    <li
      className={`grid gap-3 border-l-4 py-3 pl-3 sm:grid-cols-[7rem_1fr_1fr_auto] sm:items-start ${selected ? 'border-glass bg-glass-wash' : 'border-line'}`}
    >
      <Field
        label="Label"
        value={lane.label}
        maxLength={80}
        onChange={(event) => onChange({ label: event.target.value })}
      />
      <Select
        label="Holds"
        options={kinds}
        placeholder={subject.kind ? undefined : 'choose'}
        value={subject.kind ?? ''}
        onChange={(event) => become({ ...subject, kind: event.target.value as Subject['kind'] })}
      />
      <div className="flex flex-col gap-3">
        {withFraction ? (
          <Select
            label="Fraction"
            placeholder="choose"
            value={subject.code ?? ''}
            options={fractions.map(({ code, cut }) => ({ value: code, label: `${code} (${cut})` }))}
            onChange={(event) => become({ ...subject, code: event.target.value || undefined })}
          />
        ) : null}
        {withCompound ? (
          <Combobox
            label="Compound"
            optional
            search={compoundSearch}
            initial={subject.compound ? { value: subject.compound.id, label: subject.compound.name } : null}
            onChoose={(option) =>
              become({ ...subject, compound: option ? { id: option.value, name: option.label } : undefined })
            }
            nothingFound="Nothing found. A PI can add it under Compounds."
          />
        ) : null}
        {mayBeDiluted(subject) ? (
          <NumberField
            label="Diluted to"
            unit="%"
            optional
            value={lane.dilutionPercent}
            onChange={(event) => onChange({ dilutionPercent: event.target.value })}
          />
        ) : null}
      </div>
      <Button variant="quiet" onClick={onRemove} aria-label={`Remove lane ${lane.label}`} className="sm:mt-6">
        Remove
      </Button>
    </li>
  );
}
