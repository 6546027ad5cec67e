import type { ReactNode } from 'react';

/** One part of the page of a record, with its heading and what can be done there. */
export function SheetSection({
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
    <section aria-labelledby={id} className="mb-8 min-w-0">
      <div className="mb-2 flex flex-wrap items-center justify-between gap-2">
        <h2 id={id} className="text-xl">
          {title}
        </h2>
        {action}
      </div>
      {children}
    </section>
  );
}
