'use client';
import { useId, type InputHTMLAttributes, type ReactNode } from 'react';

type CheckboxProps = Omit<InputHTMLAttributes<HTMLInputElement>, 'type'> & {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | null;
};

/** A checkbox whose whole row, 44 px high, is the target. */
export function Checkbox({ label, hint, error, id, className = '', ...input }: CheckboxProps) {
  const ownId = useId();
  const boxId = id ?? ownId;
  const described = [hint ? `${boxId}-hint` : null, error ? `${boxId}-error` : null]
    .filter(Boolean)
    .join(' ');
  return (
    <div className={className}>
      <label htmlFor={boxId} className="flex min-h-target items-center gap-3 py-1">
        <input
          {...input}
          id={boxId}
          type="checkbox"
          aria-describedby={described || undefined}
          aria-invalid={error ? true : undefined}
          className="size-5 shrink-0 accent-glass"
        />
        <span>{label}</span>
      </label>
      {hint ? (
        <p id={`${boxId}-hint`} className="ml-8 text-sm text-ink-soft">
          {hint}
        </p>
      ) : null}
      <p
        id={`${boxId}-error`}
        role="alert"
        className={error ? 'ml-8 text-sm font-bold text-fails' : 'hidden'}
      >
        {error}
      </p>
    </div>
  );
}
