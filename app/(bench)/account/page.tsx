import type { Metadata } from 'next';
import Link from 'next/link';
import { SignOutButton } from '@/components/accounts/sign-out-button';
import { SignOutEverywhere } from '@/components/accounts/sign-out-everywhere';
import { buttonClass } from '@/components/ui/button-class';
import { PageHeader } from '@/components/ui/page-header';
import { presentActor } from '@/lib/accounts/present';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const actor = await requirePageActor();
  const groups = presentActor(actor).groups ?? [];
  return (
    <>
      <PageHeader title={actor.name} sub={actor.email} />
      <section className="mb-8">
        <h2 className="mb-2 text-lg">Groups and roles</h2>
        {groups.length === 0 ? (
          <p>You are in no group yet. An administrator can add you to one.</p>
        ) : (
          <ul className="max-w-prose divide-y divide-line border-y border-line">
            {groups.map((group) => (
              <li key={group.id} className="flex flex-wrap justify-between gap-x-4 py-3">
                <span className="font-bold">{group.name}</span>
                <span>{group.roles.join(', ')}</span>
              </li>
            ))}
          </ul>
        )}
        {actor.isAdmin ? <p className="mt-2">This account administers Heartcut.</p> : null}
      </section>
      <section className="flex flex-wrap gap-3">
        <Link href="/account/password" className={buttonClass('secondary')}>
          Change password
        </Link>
        <SignOutEverywhere />
        <SignOutButton />
      </section>
    </>
  );
}
