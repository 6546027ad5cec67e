'use client';
import type { SelectHTMLAttributes } from 'react';
import { CONTROL, FieldFrame, type FieldTexts } from './field';

export type SelectOption = { value: string; label: string; disabled?: boolean };
type SelectProps = FieldTexts &
  SelectHTMLAttributes<HTMLSelectElement> & { options: readonly SelectOption[]; placeholder?: string };

/** The browser's own select: it works with gloves, with a keyboard and with a phone's wheel. */
export function Select({
  label,
  hint,
  error,
  optional,
  id,
  className,
  options,
  placeholder,
  ...select
}: SelectProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} optional={optional} id={id} className={className}>
      {(ties) => (
        <select {...select} {...ties} className={CONTROL}>
          {placeholder !== undefined ? <option value="">{placeholder}</option> : null}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </FieldFrame>
  );
}
