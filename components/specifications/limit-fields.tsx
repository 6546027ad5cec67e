'use client';

import { Checkbox } from '@/components/ui/checkbox';
import { NumberField } from '@/components/ui/number-field';
import { VISUALISERS } from '@/lib/evidence/tlc/visualisers';
import type { LimitTexts } from './read-limits';

type LimitFieldsProps = {
  limits: LimitTexts;
  errors: Record<string, string>;
  onChange: (limits: LimitTexts) => void;
};

const fields = [
  { name: 'gcAreaPercentMin', path: 'gcAreaPercentMin', label: 'GC: target at least', unit: 'area %' },
  {
    name: 'gcSingleImpurityMaxPercent',
    path: 'gcSingleImpurityMaxPercent',
    label: 'GC: any one impurity at most',
    unit: 'area %',
  },
  {
    name: 'refractiveIndexTolerance',
    path: 'refractiveIndexTolerance',
    label: 'Refractive index: difference at most',
    unit: 'of n',
  },
  {
    name: 'boilingToleranceC',
    path: 'boilingRange.toleranceC',
    label: 'Boiling range: from expected at most',
    unit: '°C',
  },
  {
    name: 'boilingMaximumWidthC',
    path: 'boilingRange.maximumWidthC',
    label: 'Boiling range: width at most',
    unit: '°C',
  },
  { name: 'waterMaxPercent', path: 'waterMaxPercent', label: 'Water at most', unit: 'area %' },
] as const;

/** The limits; what is left empty is not asked for. */
export function LimitFields({ limits, errors, onChange }: LimitFieldsProps) {
  const toggle = (id: string, on: boolean) =>
    onChange({
      ...limits,
      tlcCleanUnder: on ? [...limits.tlcCleanUnder, id] : limits.tlcCleanUnder.filter((one) => one !== id),
    });
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-2">
        {fields.map(({ name, path, label, unit }) => (
          <NumberField
            key={name}
            label={label}
            optional
            unit={unit}
            value={limits[name]}
            error={errors[name] ?? errors[`criteria.${path}`] ?? null}
            onChange={(event) => onChange({ ...limits, [name]: event.target.value })}
          />
        ))}
      </div>
      <fieldset>
        <legend className="font-bold">TLC: one spot under</legend>
        <div className="grid sm:grid-cols-2">
          {VISUALISERS.map((visualiser) => (
            <Checkbox
              key={visualiser.id}
              label={visualiser.name}
              checked={limits.tlcCleanUnder.includes(visualiser.id)}
              onChange={(event) => toggle(visualiser.id, event.target.checked)}
            />
          ))}
        </div>
      </fieldset>
    </>
  );
}
