import type { ReactNode } from 'react';

type EmptyStateProps = {
  /** What is not here: "No fraction waits for you." */
  title: string;
  /** What to do next, in a sentence. */
  children: ReactNode;
  /** The button or link that does it. */
  action?: ReactNode;
};

/** An empty list: says what is not here and what to do next. The picture is an empty receiver on the bench. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-center gap-3 rounded-lg border border-dashed border-line-strong px-6 py-10 text-center">
      <svg width="56" height="64" viewBox="0 0 56 64" aria-hidden="true" className="text-line-strong">
        <path
          d="M22 6v17a19 19 0 1 0 12 0V6"
          fill="none"
          stroke="currentColor"
          strokeWidth="2"
          strokeLinecap="round"
        />
        <path d="M18.5 6h19M2 61.5h52" stroke="currentColor" strokeWidth="2" strokeLinecap="round" />
        <path
          d="M16 33a14 14 0 0 0-2.5 12"
          fill="none"
          stroke="currentColor"
          strokeWidth="1.5"
          strokeLinecap="round"
        />
      </svg>
      <p className="text-lg font-bold">{title}</p>
      <div className="max-w-prose text-ink-soft">{children}</div>
      {action}
    </div>
  );
}
