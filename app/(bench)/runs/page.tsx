import type { Metadata } from 'next';
import Link from 'next/link';
import { RunSearch } from '@/components/runs/run-search';
import { RunsTable } from '@/components/runs/runs-table';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/page-actor';
import { listRuns } from '@/lib/distillation/list-runs';
import { runListQuery } from '@/lib/distillation/schema';

export const metadata: Metadata = { title: 'Runs' };

type Search = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function RunsPage({ searchParams }: Search) {
  const actor = await requirePageActor();
  const given = await searchParams;
  // An address that was edited by hand shows the list from its beginning rather than an error.
  const parsed = runListQuery.partial().safeParse({ q: given.q || undefined, cursor: given.cursor });
  const { q, cursor } = parsed.success ? parsed.data : {};
  const { items, nextCursor } = await listRuns(actor, { q, cursor, limit: 50 });
  const next = new URLSearchParams({ ...(q && { q }), ...(nextCursor && { cursor: nextCursor }) });
  const start = (
    <Link className={buttonClass('primary')} href="/runs/new">
      New run
    </Link>
  );
  return (
    <>
      <PageHeader title="Runs" sub="Distillations of your groups" actions={start} />
      {q || items.length > 0 ? <RunSearch q={q ?? ''} key={q} /> : null}
      {items.length > 0 ? (
        <RunsTable runs={items} />
      ) : q ? (
        <EmptyState title={`No run holds “${q}”.`}>
          Try a part of the code, or the name of the target.
        </EmptyState>
      ) : (
        <EmptyState title="No run yet." action={start}>
          Start one when the charge is weighed: it keeps the fractions, readings and plates together.
        </EmptyState>
      )}
      <nav aria-label="Pages" className="mt-6 flex flex-wrap gap-3">
        {cursor ? (
          <Link className={buttonClass('quiet')} href={q ? `/runs?${new URLSearchParams({ q })}` : '/runs'}>
            Back to the latest
          </Link>
        ) : null}
        {nextCursor ? (
          <Link className={buttonClass()} href={`/runs?${next}`}>
            Earlier runs
          </Link>
        ) : null}
      </nav>
    </>
  );
}
