import type { Metadata } from 'next';
import Link from 'next/link';
import { EventList } from '@/components/audit/event-list';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { listAuditEvents } from '@/lib/audit/list-events';
import { auditQuery } from '@/lib/audit/schema';
import { whyNot } from '@/lib/auth/authorise';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Audit trail' };

export default async function AuditPage({ searchParams }: { searchParams: Promise<Record<string, string>> }) {
  const actor = await requirePageActor();
  const header = (
    <PageHeader
      title="Audit trail"
      sub="Who did what to which record, when and why. Nothing here can be changed or deleted."
    />
  );
  const reason = whyNot(actor, 'audit.read', null);
  if (reason) {
    return (
      <>
        {header}
        <Notice title="For PIs and administrators">
          Ask the PI of your group for the history of a record.
        </Notice>
      </>
    );
  }
  const asked = auditQuery.safeParse(await searchParams);
  if (!asked.success) {
    return (
      <>
        {header}
        <Notice kind="fails" title="This address asks for something the trail does not know">
          <Link href="/audit">Show the whole trail</Link>
        </Notice>
      </>
    );
  }
  const { items, nextCursor } = await listAuditEvents(actor, asked.data);
  const older = new URLSearchParams(await searchParams);
  if (nextCursor) older.set('cursor', nextCursor);
  return (
    <>
      {header}
      {asked.data.record ? (
        <p className="mb-3">
          Only {asked.data.record}.{' '}
          <Link href="/audit" className="link">
            Show the whole trail
          </Link>
        </p>
      ) : null}
      {items.length === 0 ? (
        <EmptyState title="No event here">
          Every change of a record of your groups will be listed here, newest first.
        </EmptyState>
      ) : (
        <EventList events={items} />
      )}
      {nextCursor ? (
        <p className="mt-4">
          <Link href={`/audit?${older}`} className={buttonClass('secondary')}>
            Older events
          </Link>
        </p>
      ) : null}
    </>
  );
}
