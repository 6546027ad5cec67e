import type { Metadata } from 'next';
import Link from 'next/link';
import { SheetSection } from '@/components/ui/sheet-section';
import { WaitingTable } from '@/components/signoff/waiting-table';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { findWhatWaits } from '@/lib/acceptance/what-waits';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Bench' };

/** What waits for whoever is signed in. */
export default async function BenchPage() {
  const actor = await requirePageActor();
  const { returned, open, toSign, trayCount } = await findWhatWaits(actor);
  const isChemist = actor.memberships.some((one) => one.role === 'chemist');
  const nothing =
    returned.items.length === 0 && open.items.length === 0 && !toSign?.items.length && !trayCount;
  return (
    <>
      <PageHeader
        title="Bench"
        sub={`What waits for you, ${actor.name}`}
        actions={
          isChemist ? (
            <Link href="/runs/new" className={buttonClass('primary')}>
              Start a run
            </Link>
          ) : undefined
        }
      />
      {actor.memberships.length === 0 ? (
        <Notice kind="needs you" title="You are in no group yet">
          Ask an administrator for a role in a group; then its runs and fractions show here.
        </Notice>
      ) : nothing ? (
        <EmptyState
          title="Nothing waits for you"
          action={
            <Link href="/runs" className={buttonClass()}>
              See the runs
            </Link>
          }
        >
          Fractions that you collect, that come back to you, or that wait for your signature stand here.
        </EmptyState>
      ) : null}
      {returned.items.length > 0 ? (
        <SheetSection id="returned" title="Came back to you">
          <WaitingTable caption="With what has to be done" rows={returned.items} />
        </SheetSection>
      ) : null}
      {toSign && toSign.items.length > 0 ? (
        <SheetSection
          id="to-sign"
          title="Waits for a signature"
          action={
            <Link href="/queue" className="link inline-flex min-h-target items-center">
              Whole queue
            </Link>
          }
        >
          <WaitingTable caption="Submitted, the oldest first" rows={toSign.items} />
        </SheetSection>
      ) : null}
      {trayCount ? (
        <div className="mb-8">
          <Notice
            kind="needs you"
            title={`${trayCount} ${trayCount === 1 ? 'file waits' : 'files wait'} in the tray`}
            action={
              <Link href="/tray" className={buttonClass()}>
                Give them their fraction
              </Link>
            }
          >
            They were sent by an instrument without a fraction that Heartcut knows.
          </Notice>
        </div>
      ) : null}
      {open.items.length > 0 ? (
        <SheetSection id="open" title="Your open fractions">
          <WaitingTable caption="Not submitted yet, with what is missing" rows={open.items} />
        </SheetSection>
      ) : null}
    </>
  );
}
