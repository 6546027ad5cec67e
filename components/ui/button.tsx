'use client';
import { useId, type ButtonHTMLAttributes, type ReactNode } from 'react';
import { buttonClass, type ButtonVariant } from './button-class';

type ButtonProps = Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'disabled'> & {
  variant?: ButtonVariant;
  /** While true the button keeps its place and its focus, says so, and ignores presses. */
  busy?: boolean;
  /** Why it may not be used now. The button stays visible and focusable and says why under itself. */
  disabledReason?: string | null;
  icon?: ReactNode;
};

/** A button that is never merely grey: when it may not be used it says why. `type` is "button" unless given. */
export function Button({
  variant = 'secondary',
  busy = false,
  disabledReason,
  icon,
  children,
  className = '',
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  const reasonId = useId();
  const still = busy || Boolean(disabledReason);
  const button = (
    <button
      {...rest}
      type={type}
      aria-disabled={still || undefined}
      aria-busy={busy || undefined}
      aria-describedby={
        [rest['aria-describedby'], disabledReason ? reasonId : null].filter(Boolean).join(' ') || undefined
      }
      onClick={(event) => {
        if (still) event.preventDefault();
        else onClick?.(event);
      }}
      className={buttonClass(
        variant,
        `${busy ? 'cursor-progress' : ''} ${className}`,
        Boolean(disabledReason),
      )}
    >
      {busy ? <Swirl /> : icon}
      {children}
    </button>
  );
  if (!disabledReason) return button;
  return (
    <span className="inline-flex max-w-full flex-col items-start gap-1">
      {button}
      <span id={reasonId} className="max-w-prose text-sm text-ink-soft">
        {disabledReason}
      </span>
    </span>
  );
}

/** A drop that pulses while something is on its way. */
function Swirl() {
  return (
    <svg width="14" height="14" viewBox="0 0 16 16" aria-hidden="true" className="animate-fade shrink-0">
      <path
        d="M8 1.5c2.3 2.9 4.4 5.2 4.4 7.9a4.4 4.4 0 0 1-8.8 0C3.6 6.7 5.7 4.4 8 1.5Z"
        fill="currentColor"
      />
    </svg>
  );
}
