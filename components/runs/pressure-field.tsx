'use client';
import { useId } from 'react';
import { CONTROL, FieldFrame, type FieldTexts } from '@/components/ui/field';
import { PRESSURE_UNITS, usePressureUnit, type ChosenPressureUnit } from './use-pressure-unit';

type PressureFieldProps = FieldTexts & {
  value: string;
  onChange: (text: string) => void;
  name?: string;
  placeholder?: string;
};

/** A pressure as typed, with the unit to read it in. The unit is remembered on this device. */
export function PressureField({ value, onChange, name, placeholder, ...texts }: PressureFieldProps) {
  const [unit, chooseUnit] = usePressureUnit();
  const unitId = useId();
  return (
    <FieldFrame {...texts}>
      {(ties) => (
        <span className="flex items-stretch">
          <input
            {...ties}
            name={name}
            value={value}
            placeholder={placeholder}
            onChange={(event) => onChange(event.target.value)}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            spellCheck={false}
            className={`${CONTROL} rounded-r-none`}
          />
          <select
            id={unitId}
            aria-label="Unit of the pressure"
            value={unit}
            onChange={(event) => chooseUnit(event.target.value as ChosenPressureUnit)}
            className="min-h-target shrink-0 rounded-r border border-l-0 border-line-strong bg-paper-sunk px-2 text-base text-ink"
          >
            {PRESSURE_UNITS.map((each) => (
              <option key={each} value={each}>
                {each}
              </option>
            ))}
          </select>
        </span>
      )}
    </FieldFrame>
  );
}
