'use client';
import Link from 'next/link';
import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';
import { MoreMenu } from './more-menu';
import { PlaceIcon } from './place-icon';
import { isWithin, MAIN_PLACES, MORE_PLACES } from './places';
import { SkipLink } from './skip-link';
import { Wordmark } from './wordmark';

type AppShellProps = {
  user: { name: string; isAdmin: boolean; roles: readonly string[] };
  groups: readonly { code: string; name: string }[];
  /** A form or button that signs out. */
  signOutAction: ReactNode;
  children: ReactNode;
};

/** Around each signed-in page: places on top on a desk, at the thumb on a phone; everything else in the menu. */
export function AppShell({ user, groups, signOutAction, children }: AppShellProps) {
  const pathname = usePathname() ?? '';
  const menu = { user, groups, signOutAction };
  const groupNames = groups.map((group) => group.name).join(', ');
  const inMenu = MORE_PLACES.some((place) => isWithin(pathname, place.href));
  return (
    <div className="flex min-h-dvh flex-col">
      <SkipLink />
      <header className="sticky top-0 z-20 border-b border-line bg-paper max-lg:static no-print">
        <div className="mx-auto flex h-bar max-w-page items-center gap-6 px-4 lg:px-6">
          <Link href="/bench" aria-label="Heartcut, to the bench" className="flex min-h-target items-center">
            <Wordmark />
          </Link>
          <nav aria-label="Main places" className="hidden h-full lg:block">
            <ul className="flex h-full">
              {MAIN_PLACES.map((place) => {
                const here = isWithin(pathname, place.href);
                return (
                  <li key={place.href} className="h-full">
                    <Link
                      href={place.href}
                      aria-current={here ? 'page' : undefined}
                      className={`flex h-full items-center border-b-[3px] px-4 -outline-offset-3 ${
                        here
                          ? 'border-glass font-bold text-ink'
                          : 'border-transparent text-ink-soft hover:text-ink'
                      }`}
                    >
                      {place.label}
                    </Link>
                  </li>
                );
              })}
            </ul>
          </nav>
          <p className="ml-auto min-w-0 truncate text-right text-sm text-ink-soft">
            <span className="sr-only">Group: </span>
            {groupNames || 'no group yet'}
            <span className="hidden text-ink lg:inline"> · {user.name}</span>
          </p>
          <div className="hidden lg:block">
            <MoreMenu
              {...menu}
              trigger={
                <button
                  type="button"
                  className={`flex min-h-target items-center gap-2 rounded border px-3 font-bold hover:border-glass hover:text-glass-strong ${
                    inMenu ? 'border-glass text-glass' : 'border-line-strong'
                  }`}
                >
                  <PlaceIcon of="more" />
                  More
                </button>
              }
            />
          </div>
        </div>
      </header>
      <main
        id="main"
        tabIndex={-1}
        className="mx-auto w-full max-w-page flex-1 px-4 pt-5 pb-24 outline-none lg:px-6 lg:pb-10"
      >
        {children}
      </main>
      <nav
        aria-label="Main places"
        className="fixed inset-x-0 bottom-0 z-20 border-t border-line-strong bg-paper-raised pb-[env(safe-area-inset-bottom)] lg:hidden no-print"
      >
        <ul className="grid grid-cols-5">
          {MAIN_PLACES.map((place) => {
            const here = isWithin(pathname, place.href);
            return (
              <li key={place.href}>
                <Link href={place.href} aria-current={here ? 'page' : undefined} className={barItem(here)}>
                  <PlaceIcon of={place.href} />
                  {place.label}
                </Link>
              </li>
            );
          })}
          <li>
            <MoreMenu
              {...menu}
              trigger={
                <button type="button" className={`${barItem(inMenu)} w-full`}>
                  <PlaceIcon of="more" />
                  More
                </button>
              }
            />
          </li>
        </ul>
      </nav>
    </div>
  );
}

function barItem(here: boolean): string {
  return (
    'flex min-h-14 flex-col items-center justify-center gap-0.5 border-t-[3px] text-xs -outline-offset-3 ' +
    (here ? 'border-glass font-bold text-glass-strong' : 'border-transparent text-ink-soft')
  );
}
