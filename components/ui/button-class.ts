export type ButtonVariant = 'primary' | 'secondary' | 'quiet' | 'danger';

const LOOK: Record<ButtonVariant, string> = {
  primary: 'border-glass bg-glass text-glass-on hover:bg-glass-strong hover:border-glass-strong',
  secondary: 'border-line-strong bg-paper-raised text-ink hover:border-glass hover:text-glass-strong',
  quiet: 'border-transparent bg-transparent text-glass hover:bg-glass-wash hover:text-glass-strong',
  danger: 'border-fails bg-paper-raised text-fails hover:bg-fails hover:text-fails-on',
};
const STILL = 'border-dashed border-line-strong bg-paper-sunk text-ink-soft cursor-not-allowed';
const SHAPE =
  'inline-flex min-h-target min-w-target items-center justify-center gap-2 rounded border px-4 py-2 text-base font-bold ' +
  'transition-colors duration-150 select-none no-print';

/** The classes of a button, also for a link that looks like one. `still`: visible, but may not be used now. */
export function buttonClass(variant: ButtonVariant = 'secondary', className = '', still = false): string {
  return `${SHAPE} ${still ? STILL : LOOK[variant]} ${className}`;
}
