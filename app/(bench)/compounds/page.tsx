import Link from 'next/link';
import { redirect } from 'next/navigation';
import type { Metadata } from 'next';
import { CompoundCard } from '@/components/compounds/compound-card';
import { CompoundDialog } from '@/components/compounds/compound-dialog';
import { CompoundSearch } from '@/components/compounds/compound-search';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { requirePageActor } from '@/lib/auth/page-actor';
import { listCompounds } from '@/lib/compounds/list-compounds';
import { Problem } from '@/lib/errors';
import { readListAddress } from '@/lib/compounds/list-address';

export const metadata: Metadata = { title: 'Compounds' };

type Search = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function CompoundsPage({ searchParams }: Search) {
  const actor = await requirePageActor();
  const { q, cursor } = readListAddress(await searchParams);
  const { items, nextCursor } = await firstPageInstead(q, listCompounds(actor, { q, cursor, limit: 24 }));
  const next = new URLSearchParams({ ...(q && { q }), ...(nextCursor && { cursor: nextCursor }) });
  return (
    <>
      <PageHeader
        title="Compounds"
        sub="Structures, hazards and literature values, shared by all groups"
        actions={<CompoundDialog disabledReason={whyNot(actor, 'compound.write', null)} />}
      />
      <CompoundSearch q={q ?? ''} key={q} />
      {items.length === 0 ? (
        <EmptyState title={q ? `Nothing found for “${q}”.` : 'No compound is kept yet.'}>
          {q
            ? 'Try a synonym, the CAS number or the formula. A PI can add a compound that is not here.'
            : 'A PI can add the first one.'}
        </EmptyState>
      ) : (
        <ul className="grid grid-cols-1 gap-4 sm:grid-cols-2 lg:grid-cols-3 xl:grid-cols-4">
          {items.map((compound) => (
            <li key={compound.id}>
              <CompoundCard compound={compound} />
            </li>
          ))}
        </ul>
      )}
      <nav aria-label="Pages" className="mt-6 flex flex-wrap gap-3">
        {cursor ? (
          <Link
            className={buttonClass('quiet')}
            href={`/compounds${q ? `?${new URLSearchParams({ q })}` : ''}`}
          >
            Back to the beginning
          </Link>
        ) : null}
        {nextCursor ? (
          <Link className={buttonClass()} href={`/compounds?${next}`}>
            More compounds
          </Link>
        ) : null}
      </nav>
    </>
  );
}

/** A cursor that somebody cut short or kept from another search leads to the beginning, not to an error. */
async function firstPageInstead<T>(q: string | undefined, page: Promise<T>): Promise<T> {
  try {
    return await page;
  } catch (error) {
    if (error instanceof Problem && error.code === 'malformed')
      redirect(`/compounds${q ? `?${new URLSearchParams({ q })}` : ''}`);
    throw error;
  }
}
