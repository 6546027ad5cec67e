'use client';
import type { TextareaHTMLAttributes } from 'react';
import { CONTROL, FieldFrame, type FieldTexts } from './field';

type TextareaProps = FieldTexts & TextareaHTMLAttributes<HTMLTextAreaElement>;

/** Several lines of text. */
export function Textarea({ label, hint, error, optional, id, className, rows = 3, ...area }: TextareaProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} optional={optional} id={id} className={className}>
      {(ties) => <textarea rows={rows} {...area} {...ties} className={CONTROL} />}
    </FieldFrame>
  );
}
