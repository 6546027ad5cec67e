'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Checkbox } from '@/components/ui/checkbox';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { sayDone } from '@/components/ui/toaster';
import { Field } from '@/components/ui/field';
import {
  isLiteratureProperty,
  LITERATURE_PROPERTY_NAMES,
  type LiteratureProperty,
  propertyDefinition,
} from '@/lib/compounds/property-names';
import type { LiteratureValueJson } from '@/lib/compounds/schema';
import { api } from '@/lib/http/client';
import { FormSheet } from './form-sheet';
import { LiteratureFields } from './literature-fields';
import { numberOf, textOf } from './read-form';

const CONDITIONS = ['temperatureC', 'pressureKPa', 'wavelengthNm', 'rangeMinC', 'rangeMaxC'] as const;

function bodyOf(form: FormData, property: LiteratureProperty, corrects: string | undefined) {
  const names = propertyDefinition(property).coefficients;
  const coefficients = names && Object.fromEntries(names.map((name) => [name, numberOf(form, name)]));
  const filled = coefficients && Object.values(coefficients).every((number) => number !== null);
  return {
    property,
    value: names ? undefined : numberOf(form, 'value'),
    coefficients: names ? (filled ? coefficients : {}) : undefined,
    ...Object.fromEntries(CONDITIONS.map((name) => [name, numberOf(form, name)])),
    uncertainty: numberOf(form, 'uncertainty'),
    source: textOf(form, 'source') ?? '',
    note: textOf(form, 'note'),
    preferred: form.get('preferred') === 'on' || undefined,
    corrects,
    reason: textOf(form, 'reason') ?? undefined,
  };
}

type LiteratureDialogProps = {
  compoundId: string;
  /** The value to correct; without one a value is added. */
  corrects?: LiteratureValueJson;
  disabledReason: string | null;
};

/** Adds a literature value, or corrects one: the old value stays and is shown as replaced. */
export function LiteratureDialog({ compoundId, corrects, disabledReason }: LiteratureDialogProps) {
  const router = useRouter();
  const given = corrects && isLiteratureProperty(corrects.property) ? corrects.property : null;
  const [property, setProperty] = useState<LiteratureProperty>(given ?? 'refractive index');
  async function send(form: FormData) {
    await api(`/api/v1/compounds/${compoundId}/literature`, { json: bodyOf(form, property, corrects?.id) });
    sayDone(corrects ? 'Value corrected; the old one stays' : 'Value added');
    router.refresh();
  }
  return (
    <FormSheet
      button={corrects ? 'Correct' : 'Add a value'}
      variant={corrects ? 'quiet' : 'secondary'}
      disabledReason={disabledReason}
      title={corrects ? `Correct: ${corrects.property}` : 'Add a literature value'}
      description="With the conditions under which it holds and the publication it stands in."
      confirm={corrects ? 'Save the correction' : 'Add the value'}
      onSend={send}
    >
      {(errors) => (
        <>
          {corrects ? null : (
            <Select
              label="Property"
              value={property}
              onChange={(event) => {
                if (isLiteratureProperty(event.target.value)) setProperty(event.target.value);
              }}
              options={LITERATURE_PROPERTY_NAMES.map((name) => ({ value: name, label: name }))}
            />
          )}
          <LiteratureFields key={property} property={property} given={corrects} errors={errors} />
          <Field
            label="Source"
            hint="Author, title, edition, page or table."
            name="source"
            defaultValue={corrects?.source}
            required
            error={errors.source}
          />
          <Field label="Note" optional name="note" defaultValue={corrects?.note ?? ''} error={errors.note} />
          {corrects ? (
            <Textarea
              label="Why it is corrected"
              hint="Kept in the audit trail and beside the value."
              name="reason"
              required
              error={errors.reason}
            />
          ) : (
            <>
              <Checkbox
                label="Prefer this value"
                name="preferred"
                hint="The preferred value is the one that measurements are compared with."
              />
              <Textarea
                label="Why it is preferred"
                optional
                hint="Needed where it lies far from the preferred value before. Kept in the audit trail."
                name="reason"
                error={errors.reason}
              />
            </>
          )}
        </>
      )}
    </FormSheet>
  );
}
