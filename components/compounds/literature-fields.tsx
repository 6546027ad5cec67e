'use client';
import { NumberField } from '@/components/ui/number-field';
import {
  type Condition,
  type LiteratureProperty,
  NORMAL_PRESSURE_KPA,
  propertyDefinition,
  SODIUM_D_NM,
} from '@/lib/compounds/property-names';
import type { LiteratureValueJson } from '@/lib/compounds/schema';

const CONDITION_FIELDS: Readonly<Record<Condition, { label: string; unit: string; signed?: true }>> = {
  temperatureC: { label: 'Temperature', unit: '°C', signed: true },
  pressureKPa: { label: 'Pressure', unit: 'kPa' },
  wavelengthNm: { label: 'Wavelength', unit: 'nm' },
  rangeMinC: { label: 'Holds from', unit: '°C', signed: true },
  rangeMaxC: { label: 'Holds to', unit: '°C', signed: true },
};

/** What is usual, so that it need not be typed. */
function usual(condition: Condition, property: LiteratureProperty): number | undefined {
  if (condition === 'wavelengthNm') return SODIUM_D_NM;
  return condition === 'pressureKPa' && property === 'normal boiling point' ? NORMAL_PRESSURE_KPA : undefined;
}

type LiteratureFieldsProps = {
  property: LiteratureProperty;
  given?: LiteratureValueJson;
  errors: Record<string, string>;
};

/** Number or coefficients of a property, and the conditions that belong to it. */
export function LiteratureFields({ property, given, errors }: LiteratureFieldsProps) {
  const { unit, coefficients, requires, wants } = propertyDefinition(property);
  const places = property === 'refractive index' ? 4 : 0;
  const number = given?.value ?? null;
  return (
    <>
      {coefficients ? (
        <>
          <p className="text-sm text-ink-soft">{EQUATIONS[property]}</p>
          <div className="grid gap-4 sm:grid-cols-2">
            {coefficients.map((name) => (
              <NumberField
                key={name}
                label={NAMES[name] ?? name}
                name={name}
                signed
                defaultValue={given?.coefficients?.[name] ?? ''}
                error={errors[name] ?? errors.coefficients}
              />
            ))}
          </div>
        </>
      ) : (
        <div className="grid gap-4 sm:grid-cols-2">
          <NumberField
            label="Value"
            name="value"
            signed
            unit={unit === '1' ? undefined : unit}
            defaultValue={number === null ? '' : padded(number, places)}
            error={errors.value}
          />
          <NumberField
            label="Uncertainty"
            optional
            name="uncertainty"
            unit={unit === '1' ? undefined : unit}
            defaultValue={given?.uncertainty ?? ''}
            error={errors.uncertainty}
          />
        </div>
      )}
      <div className="grid gap-4 sm:grid-cols-2">
        {[...requires, ...wants].map((condition) => (
          <NumberField
            key={condition}
            {...CONDITION_FIELDS[condition]}
            optional={wants.includes(condition)}
            name={condition}
            defaultValue={given?.conditions[condition] ?? usual(condition, property) ?? ''}
            error={errors[condition]}
          />
        ))}
      </div>
    </>
  );
}

function padded(value: number, places: number): string {
  const own = String(value).split('.')[1]?.length ?? 0;
  return value.toFixed(Math.max(own, places));
}

const NAMES: Readonly<Record<string, string>> = {
  criticalTemperatureK: 'Critical temperature in K',
  criticalPressureKPa: 'Critical pressure in kPa',
};

const EQUATIONS: Readonly<Partial<Record<LiteratureProperty, string>>> = {
  'Antoine coefficients': 'log₁₀(P/kPa) = A − B / (t/°C + C)',
  'Wagner coefficients': 'ln(P/Pc) = (A x + B x^1.5 + C x^2.5 + D x^5) Tc/T, with x = 1 − T/Tc',
};
