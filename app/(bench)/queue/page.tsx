import type { Metadata } from 'next';
import Link from 'next/link';
import { WaitingTable } from '@/components/signoff/waiting-table';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { listWaiting } from '@/lib/acceptance/list-waiting';
import { visibleGroupIds } from '@/lib/auth/actor';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Queue' };

/** Submitted fractions of the groups of the reader, those that have waited longest on top. */
export default async function QueuePage({ searchParams }: { searchParams: Promise<{ cursor?: string }> }) {
  const actor = await requirePageActor();
  const { cursor } = await searchParams;
  const filter = { groupIds: visibleGroupIds(actor), statuses: ['submitted' as const] };
  const { items, nextCursor } = await listWaiting(actor, filter, {
    limit: 50,
    cursor: typeof cursor === 'string' ? cursor : undefined,
  });
  return (
    <>
      <PageHeader title="Queue" sub="Submitted fractions that wait for a signature, the oldest first" />
      <WaitingTable
        caption="To look at, and to sign off or return"
        rows={items}
        empty={
          <EmptyState
            title="No fraction waits for a signature"
            action={
              <Link href="/fractions" className={buttonClass()}>
                See all fractions
              </Link>
            }
          >
            When a chemist submits one, the analysts of its group get an e-mail and it stands here.
          </EmptyState>
        }
      />
      {nextCursor ? (
        <p className="mt-4">
          <Link href={`/queue?cursor=${encodeURIComponent(nextCursor)}`} className={buttonClass()}>
            Next
          </Link>
        </p>
      ) : null}
    </>
  );
}
