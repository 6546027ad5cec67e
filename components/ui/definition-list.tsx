import type { ReactNode } from 'react';

export type Definition = {
  term: ReactNode;
  /** The value as text or a node; null is shown as "not recorded". */
  value: ReactNode | null;
  unit?: string;
  /** Under which it was measured or holds: "at 20 °C, 589 nm". */
  condition?: ReactNode;
  /** Where it comes from: a person, an instrument, a publication. */
  source?: ReactNode;
};

/** Facts, each number with its unit, its condition and its source. */
export function DefinitionList({
  items,
  columns = 1,
}: {
  items: readonly Definition[];
  columns?: 1 | 2 | 3;
}) {
  const grid = { 1: '', 2: 'sm:grid-cols-2', 3: 'sm:grid-cols-2 lg:grid-cols-3' }[columns];
  return (
    <dl className={`grid grid-cols-1 gap-x-8 ${grid}`}>
      {items.map((item, at) => (
        <div key={at} className="flex items-baseline justify-between gap-4 border-b border-line py-1.5">
          <dt className="text-ink-soft">{item.term}</dt>
          <dd className="min-w-0 text-right">
            {item.value === null ? (
              <span className="text-ink-soft italic">not recorded</span>
            ) : (
              <>
                <span className="font-bold">{item.value}</span>
                {item.unit ? (
                  <span>
                    {'\u00a0'}
                    {item.unit}
                  </span>
                ) : null}
              </>
            )}
            {item.condition ? <span className="text-sm text-ink-soft"> {item.condition}</span> : null}
            {item.source ? <span className="block text-xs text-ink-soft">{item.source}</span> : null}
          </dd>
        </div>
      ))}
    </dl>
  );
}
