'use client';
import { searchCompounds } from '@/components/runs/compound-search';
import type { Problems } from '@/components/runs/read-form';
import { Checkbox } from '@/components/ui/checkbox';
import { Combobox } from '@/components/ui/combobox';
import { NumberField } from '@/components/ui/number-field';

export type LiquidTexts = { compound: string | null; normalBoilingPointC: string; associated: boolean };
export const noLiquid: LiquidTexts = { compound: null, normalBoilingPointC: '', associated: false };

type LiquidFieldsProps = { liquid: LiquidTexts; onChange: (liquid: LiquidTexts) => void; problems: Problems };

/** A recorded compound, or a liquid of which only the normal boiling point is known. */
export function LiquidFields({ liquid, onChange, problems }: LiquidFieldsProps) {
  return (
    <>
      <Combobox
        label="Compound"
        search={searchCompounds}
        onChoose={(option) => onChange({ ...liquid, compound: option?.value ?? null })}
        nothingFound="Nothing found: empty this field and give the normal boiling point instead."
        error={problems.compound}
      />
      {liquid.compound ? null : (
        <fieldset className="flex flex-col gap-2 border-l-2 border-line pl-4">
          <legend className="sr-only">Or a liquid that is not recorded</legend>
          <NumberField
            label="Or its normal boiling point"
            unit="°C"
            signed
            hint="at 1013.25 mbar"
            value={liquid.normalBoilingPointC}
            onChange={(event) => onChange({ ...liquid, normalBoilingPointC: event.target.value })}
            error={problems.normalBoilingPointC}
          />
          <Checkbox
            label="It associates (alcohol, acid, water, phenol …)"
            checked={liquid.associated}
            onChange={(event) => onChange({ ...liquid, associated: event.target.checked })}
          />
        </fieldset>
      )}
    </>
  );
}
