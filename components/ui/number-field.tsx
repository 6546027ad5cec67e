'use client';
import type { InputHTMLAttributes } from 'react';
import { Field, type FieldTexts } from './field';

type NumberFieldProps = FieldTexts &
  Omit<InputHTMLAttributes<HTMLInputElement>, 'type' | 'inputMode'> & {
    /** Shown after the number and read out with it; `1` (a bare ratio) has none. */
    unit?: string;
    /** Offers the minus sign on phones whose number pad has none. */
    signed?: boolean;
  };

/**
 * A measured number with its unit. A text input on purpose: a number input drops what it cannot parse, rounds on a
 * scroll of the wheel and loses trailing zeros, and "1.4720" says more than 1.472.
 */
export function NumberField({ signed = false, ...props }: NumberFieldProps) {
  return (
    <Field
      {...props}
      type="text"
      inputMode={signed ? 'text' : 'decimal'}
      autoComplete="off"
      spellCheck={false}
    />
  );
}
