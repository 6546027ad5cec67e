import type { ReactNode } from 'react';

/** One part of the page of a record, with its heading and what can be done there. */
export function SheetPart({
  id,
  title,
  action,
  children,
}: {
  id: string;
  title: string;
  action?: ReactNode;
  children: ReactNode;
}) {
  return (
    <section aria-labelledby={id} className="mb-9">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3 border-b border-line pb-1">
        <h2 id={id} className="text-xl">
          {title}
        </h2>
        {action}
      </div>
      {children}
    </section>
  );
}
