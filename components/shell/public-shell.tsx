import type { ReactNode } from 'react';
import { SkipLink } from './skip-link';
import { ThemeToggle } from './theme-toggle';
import { Wordmark } from './wordmark';

type PublicShellProps = {
  children: ReactNode;
  /** `form`: one narrow sheet in the middle; `page`: as wide as a signed-in page. */
  width?: 'form' | 'page';
  /** A line beside the name: "Verification", "Shared evidence". */
  about?: string;
};

/** Around the pages that need no account: sign-in, verification, shared evidence. */
export function PublicShell({ children, width = 'form', about }: PublicShellProps) {
  const measure = width === 'form' ? 'max-w-form' : 'max-w-page';
  return (
    <div className="flex min-h-dvh flex-col">
      <SkipLink />
      <header
        className={`mx-auto flex w-full items-center justify-between gap-4 px-4 pt-6 pb-4 lg:px-6 ${measure}`}
      >
        <Wordmark size={36} />
        {about ? <p className="text-sm text-ink-soft">{about}</p> : null}
      </header>
      <main
        id="main"
        tabIndex={-1}
        className={`mx-auto w-full flex-1 px-4 pb-10 outline-none lg:px-6 ${measure}`}
      >
        {width === 'form' ? (
          <div className="rounded-lg border border-line bg-paper-raised px-5 py-6 sm:px-8">{children}</div>
        ) : (
          children
        )}
      </main>
      <footer
        className={`mx-auto flex w-full flex-wrap items-center justify-between gap-4 px-4 py-6 text-sm text-ink-soft lg:px-6 no-print ${measure}`}
      >
        <p>Which compound, how pure, how do we know, and what can the tests not see.</p>
        <ThemeToggle />
      </footer>
    </div>
  );
}
