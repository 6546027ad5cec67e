'use client';
import { Field } from '@/components/ui/field';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { VISUALISERS } from '@/lib/evidence/tlc/visualisers';
import type { Facts } from './facts';

type FactsFieldsProps = {
  facts: Facts;
  onChange: (change: Partial<Facts>) => void;
  errorOf: (path: string) => string | null;
};

/** What belongs to a plate beside its marks: phase, eluent, how it was made visible, its size. */
export function FactsFields({ facts, onChange, errorOf }: FactsFieldsProps) {
  const known = VISUALISERS.map(({ id, name }) => ({ value: id as string, label: name }));
  const other = known.some((one) => one.value === facts.visualiser)
    ? []
    : [{ value: facts.visualiser, label: facts.visualiser }];
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field
        label="Stationary phase"
        hint="Such as silica gel 60 F254 on aluminium."
        value={facts.stationaryPhase}
        maxLength={160}
        error={errorOf('stationaryPhase')}
        onChange={(event) => onChange({ stationaryPhase: event.target.value })}
      />
      <Field
        label="Eluent"
        hint="With the ratio by volume: hexane / ethyl acetate 4:1."
        value={facts.eluent}
        maxLength={200}
        error={errorOf('eluent')}
        onChange={(event) => onChange({ eluent: event.target.value })}
      />
      <Select
        label="Made visible by"
        options={[...known, ...other]}
        value={facts.visualiser}
        error={errorOf('visualiser')}
        onChange={(event) => onChange({ visualiser: event.target.value })}
      />
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="Width"
          unit="mm"
          optional
          value={facts.widthMm}
          error={errorOf('widthMm')}
          onChange={(event) => onChange({ widthMm: event.target.value })}
        />
        <NumberField
          label="Height"
          unit="mm"
          optional
          value={facts.heightMm}
          error={errorOf('heightMm')}
          onChange={(event) => onChange({ heightMm: event.target.value })}
        />
      </div>
      <Textarea
        label="Note"
        optional
        className="sm:col-span-2"
        value={facts.note}
        maxLength={1000}
        error={errorOf('note')}
        onChange={(event) => onChange({ note: event.target.value })}
      />
    </div>
  );
}
