'use client';
import { useRouter } from 'next/navigation';
import { Field } from '@/components/ui/field';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { sayDone } from '@/components/ui/toaster';
import { PEROXIDE_CLASSES, peroxideAdvice } from '@/lib/compounds/hazards';
import type { CompoundJson } from '@/lib/compounds/schema';
import { api } from '@/lib/http/client';
import { FormSheet } from './form-sheet';
import { numberOf, textOf } from './read-form';

const peroxideOptions = PEROXIDE_CLASSES.map((value) => ({
  value,
  label: `${value}: ${peroxideAdvice(value).word}`,
}));

function bodyOf(form: FormData) {
  return {
    name: textOf(form, 'name') ?? '',
    synonyms: (textOf(form, 'synonyms') ?? '').split(/\r?\n/).flatMap((line) => line.trim() || []),
    cas: textOf(form, 'cas'),
    smiles: textOf(form, 'smiles'),
    formula: textOf(form, 'formula'),
    molarMassGMol: numberOf(form, 'molarMassGMol'),
    inchiKey: textOf(form, 'inchiKey'),
    peroxideClass: textOf(form, 'peroxideClass'),
  };
}

type CompoundDialogProps = {
  /** The compound to change; without one a new one is added. */
  compound?: CompoundJson;
  disabledReason: string | null;
};

/** Adds or changes a compound. Formula and mass may stay empty where there is a structure: the server computes them. */
export function CompoundDialog({ compound, disabledReason }: CompoundDialogProps) {
  const router = useRouter();
  async function send(form: FormData) {
    const json = bodyOf(form);
    if (compound) {
      await api(`/api/v1/compounds/${compound.id}`, { method: 'PATCH', version: compound.version, json });
      sayDone('Compound changed');
      router.refresh();
      return;
    }
    const made = await api<CompoundJson>('/api/v1/compounds', { json });
    sayDone('Compound added');
    router.push(`/compounds/${made.id}`);
  }
  return (
    <FormSheet
      button={compound ? 'Change' : 'Add a compound'}
      variant={compound ? 'secondary' : 'primary'}
      disabledReason={disabledReason}
      title={compound ? `Change ${compound.name}` : 'Add a compound'}
      description="All groups share compounds. Number, formula, mass and structure are checked against each other."
      confirm={compound ? 'Save the change' : 'Add the compound'}
      onSend={send}
    >
      {(errors) => (
        <>
          <Field label="Name" name="name" defaultValue={compound?.name} required error={errors.name} />
          <Field
            label="CAS number"
            optional
            name="cas"
            defaultValue={compound?.cas ?? ''}
            error={errors.cas}
          />
          <Field
            label="SMILES"
            optional
            hint="The structure is drawn from it, and formula and mass are computed."
            name="smiles"
            defaultValue={compound?.smiles ?? ''}
            spellCheck={false}
            error={errors.smiles}
          />
          <div className="grid gap-4 sm:grid-cols-2">
            <Field
              label="Formula"
              optional
              name="formula"
              defaultValue={compound?.formula ?? ''}
              error={errors.formula}
            />
            <NumberField
              label="Molar mass"
              optional
              unit="g/mol"
              name="molarMassGMol"
              defaultValue={compound?.molarMassGMol ?? ''}
              error={errors.molarMassGMol}
            />
          </div>
          <Field
            label="InChIKey"
            optional
            name="inchiKey"
            defaultValue={compound?.inchiKey ?? ''}
            error={errors.inchiKey}
          />
          <Select
            label="Peroxide class"
            optional
            name="peroxideClass"
            placeholder="none known"
            options={peroxideOptions}
            defaultValue={compound?.peroxideClass ?? ''}
            error={errors.peroxideClass}
          />
          <Textarea
            label="Synonyms"
            optional
            hint="One a line."
            name="synonyms"
            defaultValue={compound?.synonyms.join('\n')}
            error={errors.synonyms}
          />
        </>
      )}
    </FormSheet>
  );
}
