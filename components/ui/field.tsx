'use client';
import { useId, type InputHTMLAttributes, type ReactNode } from 'react';

/** Shared by everything that is typed into. 16 px text, so that a phone does not zoom the page. */
export const CONTROL =
  'w-full min-h-target rounded border border-line-strong bg-paper-raised px-3 py-2 text-input text-ink ' +
  'hover:border-ink aria-invalid:border-fails aria-invalid:border-2 [&[readonly]]:bg-paper-sunk disabled:bg-paper-sunk disabled:text-ink-soft';

export type FieldTexts = {
  label: ReactNode;
  hint?: ReactNode;
  /** What is wrong and what to do about it. */
  error?: string | null;
  /** Says "optional" beside the label. */
  optional?: boolean;
};

/** What a control inside FieldFrame must carry so that hint and error are read out with it. */
export type ControlTies = { id: string; 'aria-describedby'?: string; 'aria-invalid'?: true };

type FieldFrameProps = FieldTexts & {
  id?: string;
  className?: string;
  children: (ties: ControlTies) => ReactNode;
};

/** Label above, control, hint and error below; ties them together for screen readers. */
export function FieldFrame({ label, hint, error, optional, id, className = '', children }: FieldFrameProps) {
  const ownId = useId();
  const controlId = id ?? ownId;
  const described = [hint ? `${controlId}-hint` : null, error ? `${controlId}-error` : null]
    .filter(Boolean)
    .join(' ');
  return (
    <div className={`flex min-w-0 flex-col gap-1 ${className}`}>
      <label htmlFor={controlId} className="text-base font-bold">
        {label}
        {optional ? <span className="font-normal text-ink-soft"> (optional)</span> : null}
      </label>
      {children({
        id: controlId,
        'aria-describedby': described || undefined,
        'aria-invalid': error ? true : undefined,
      })}
      {hint ? (
        <p id={`${controlId}-hint`} className="text-sm text-ink-soft">
          {hint}
        </p>
      ) : null}
      <p id={`${controlId}-error`} role="alert" className={error ? 'text-sm font-bold text-fails' : 'hidden'}>
        {error}
      </p>
    </div>
  );
}

type TextFieldProps = FieldTexts & InputHTMLAttributes<HTMLInputElement> & { unit?: string };

/** One line of text. `unit` stands after the input and is read out with it. */
export function Field({ label, hint, error, optional, unit, id, className, ...input }: TextFieldProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} optional={optional} id={id} className={className}>
      {(ties) =>
        unit ? (
          <span className="flex items-stretch">
            <input
              {...input}
              {...ties}
              aria-describedby={[`${ties.id}-unit`, ties['aria-describedby']].filter(Boolean).join(' ')}
              className={`${CONTROL} rounded-r-none`}
            />
            <span
              id={`${ties.id}-unit`}
              className="flex shrink-0 items-center rounded-r border border-l-0 border-line-strong bg-paper-sunk px-3 text-base text-ink-soft"
            >
              {unit}
            </span>
          </span>
        ) : (
          <input {...input} {...ties} className={CONTROL} />
        )
      }
    </FieldFrame>
  );
}
