'use client';
import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { Dialog as Radix } from 'radix-ui';
import { useState, type ReactNode } from 'react';
import { SCRIM } from '@/components/ui/dialog';
import { isWithin, MAIN_PLACES, MORE_PLACES } from './places';
import { ThemeToggle } from './theme-toggle';

type MoreMenuProps = {
  trigger: ReactNode;
  user: { name: string; isAdmin: boolean; roles: readonly string[] };
  groups: readonly { code: string; name: string }[];
  signOutAction: ReactNode;
};

/** The menu with every place, the theme, who is signed in and the way out: from below on a phone, from the side on a desk. */
export function MoreMenu({ trigger, user, groups, signOutAction }: MoreMenuProps) {
  const [open, setOpen] = useState(false);
  const pathname = usePathname() ?? '';
  const places = [...MAIN_PLACES, ...MORE_PLACES].filter((place) => !place.adminsOnly || user.isAdmin);
  return (
    <Radix.Root open={open} onOpenChange={setOpen}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Overlay className={SCRIM} />
        <Radix.Content
          aria-describedby={undefined}
          className={
            'fixed inset-x-0 bottom-0 z-50 flex max-h-[92dvh] flex-col overflow-y-auto rounded-t-lg border border-line bg-paper-raised shadow-lifted ' +
            'lg:inset-y-0 lg:right-0 lg:left-auto lg:max-h-none lg:w-96 lg:rounded-none'
          }
        >
          <div className="flex items-center justify-between border-b border-line py-2 pr-2 pl-5">
            <Radix.Title className="text-lg">All places</Radix.Title>
            <Radix.Close className="min-h-target rounded px-4 font-bold text-glass hover:bg-glass-wash">
              Close
            </Radix.Close>
          </div>
          <nav aria-label="All places" className="p-2">
            <ul className="grid grid-cols-2 gap-1 lg:grid-cols-1">
              {places.map((place) => {
                const here = isWithin(pathname, place.href);
                return (
                  <li key={place.href}>
                    <Link
                      href={place.href}
                      onClick={() => setOpen(false)}
                      aria-current={here ? 'page' : undefined}
                      className={`flex min-h-target flex-col justify-center rounded border-l-4 px-3 py-1.5 hover:bg-glass-wash ${
                        here ? 'border-glass bg-glass-wash' : 'border-transparent'
                      }`}
                    >
                      <span className="font-bold">{place.label}</span>
                      <span className="text-sm text-ink-soft">{place.hint}</span>
                    </Link>
                  </li>
                );
              })}
            </ul>
          </nav>
          <div className="mt-auto flex flex-col gap-4 border-t border-line px-5 py-4">
            <div>
              <p className="font-bold">{user.name}</p>
              <p className="text-sm text-ink-soft">
                {[groups.map((g) => g.name).join(', '), user.roles.join(', ')].filter(Boolean).join(' · ')}
              </p>
            </div>
            <ThemeToggle />
            {signOutAction}
          </div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
