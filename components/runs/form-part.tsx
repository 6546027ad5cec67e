import type { ReactNode } from 'react';

/** One part of a long form, under a heading of its own. */
export function FormPart({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-4">
      <h2 className="border-b border-line pb-1 text-lg">{title}</h2>
      {children}
    </section>
  );
}
