import type { ReactNode } from 'react';

type AnswerCardProps = {
  /** "36.4 °C" */
  figure: string;
  /** "± 0.9 °C, about 95 %" */
  doubt: string;
  /** "toluene at 66.7 mbar" */
  of: string;
  method: string;
  source: string;
  notes: readonly string[];
  children?: ReactNode;
};

/** An answer of the planner: never a number without its doubt, its method and its source. */
export function AnswerCard({ figure, doubt, of, method, source, notes, children }: AnswerCardProps) {
  return (
    <div role="status" className="self-start rounded border border-line bg-paper-raised px-4 py-4">
      <p className="text-ink-soft">{of}</p>
      <p className="flex flex-wrap items-baseline gap-x-3">
        <span className="text-3xl font-black">{figure}</span>
        <span>{doubt}</span>
      </p>
      {children}
      <p className="mt-2 text-sm text-ink-soft">
        {method}. Source: {source}
      </p>
      {notes.length > 0 ? (
        <ul className="mt-2 flex max-w-prose list-disc flex-col gap-1 pl-5 text-sm">
          {notes.map((note) => (
            <li key={note}>{note}</li>
          ))}
        </ul>
      ) : null}
    </div>
  );
}
