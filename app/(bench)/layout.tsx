import type { ReactNode } from 'react';
import { SignOutButton } from '@/components/accounts/sign-out-button';
import { AppShell } from '@/components/shell/app-shell';
import { presentActor } from '@/lib/accounts/present';
import { requirePageActor } from '@/lib/auth/page-actor';

/** Around every page that needs a signed-in person. Each page asks for the actor again: this is not the guard. */
export default async function BenchLayout({ children }: { children: ReactNode }) {
  const actor = await requirePageActor();
  const groups = presentActor(actor).groups ?? [];
  return (
    <AppShell
      user={{ name: actor.name, isAdmin: actor.isAdmin, roles: groups.flatMap((group) => group.roles) }}
      groups={groups.map((group) => ({ code: group.id, name: group.name }))}
      signOutAction={<SignOutButton />}
    >
      {children}
    </AppShell>
  );
}
