import Link from 'next/link';
import type { ReactNode } from 'react';

type PageHeaderProps = {
  title: ReactNode;
  /** Where this page hangs: the nearest last. */
  trail?: readonly { href: string; label: string }[];
  /** The state of the record, as a StateMark. */
  state?: ReactNode;
  /** One line under the title: who, when, what of. */
  sub?: ReactNode;
  actions?: ReactNode;
};

/** Title of a page with its trail, state and actions. */
export function PageHeader({ title, trail, state, sub, actions }: PageHeaderProps) {
  return (
    <header className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        {trail?.length ? (
          <nav aria-label="Where you are" className="mb-0.5 no-print">
            <ol className="flex flex-wrap items-center text-sm text-ink-soft">
              {trail.map((step) => (
                <li key={step.href} className="after:px-2 after:text-line-strong after:content-['/']">
                  <Link href={step.href} className="inline-block py-1 hover:text-glass hover:underline">
                    {step.label}
                  </Link>
                </li>
              ))}
            </ol>
          </nav>
        ) : null}
        <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
          <h1 className="text-2xl">{title}</h1>
          {state}
        </div>
        {sub ? <p className="mt-1 text-ink-soft">{sub}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap items-start gap-2">{actions}</div> : null}
    </header>
  );
}
