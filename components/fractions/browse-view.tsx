'use client';
import Link from 'next/link';
import { useRouter, useSearchParams } from 'next/navigation';
import { useState } from 'react';
import useSWRInfinite from 'swr/infinite';
import { Button } from '@/components/ui/button';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { Skeleton } from '@/components/ui/skeleton';
import { type FractionRow, fractionSorts, type FractionSort } from '@/lib/distillation/fraction-schema';
import { fetcher } from '@/lib/http/client';
import { BrowseChips } from './browse-chips';
import { BrowseFilters } from './browse-filters';
import { type BrowseState, type FilterName, readAddress, writeAddress } from './browse-filters-state';
import { BrowseTable } from './browse-table';

type Page = { items: FractionRow[]; nextCursor: string | null };
type BrowseViewProps = { groups: readonly { id: string; name: string }[] };

const sortWords: Record<FractionSort, string> = {
  '-collectedAt': 'latest first',
  '-purity': 'purest first',
  code: 'by code',
};

/** Fractions by filters. The address holds the question, so that a view can be kept, sent and walked back to. */
export function BrowseView({ groups }: BrowseViewProps) {
  const router = useRouter();
  // On a desk the filters are always in sight; this is for the phone.
  const [open, setOpen] = useState(false);
  const state = readAddress(new URLSearchParams(useSearchParams()));
  const { filters, sort } = state;
  const address = writeAddress(state);
  const path = `/api/v1/fractions?${address ? `${address}&` : ''}limit=50`;
  const { data, error, isLoading, isValidating, size, setSize, mutate } = useSWRInfinite<Page>(
    (_: number, before: Page | null) =>
      before && !before.nextCursor ? null : before ? `${path}&cursor=${before.nextCursor}` : path,
    fetcher,
    { keepPreviousData: true, revalidateFirstPage: false },
  );
  const go = (next: BrowseState) => {
    const search = writeAddress(next);
    router.replace(search ? `/fractions?${search}` : '/fractions', { scroll: false });
  };
  const set = (name: FilterName, value: string) =>
    go({ sort, filters: { ...filters, [name]: value || undefined } });
  const rows = data?.flatMap((page) => page.items) ?? [];
  const more = data?.at(-1)?.nextCursor ?? null;
  const asked = Object.keys(filters).length > 0;
  return (
    <div className="flex flex-col gap-5">
      <section aria-label="Filters" className="flex flex-col gap-3">
        <Button
          className="self-start lg:hidden"
          aria-expanded={open}
          aria-controls="fraction-filters"
          onClick={() => setOpen(!open)}
        >
          {open ? 'Hide the filters' : 'Filter'}
        </Button>
        <div id="fraction-filters" className={open ? '' : 'max-lg:hidden'}>
          <BrowseFilters filters={filters} groups={groups} onChange={set} />
        </div>
      </section>
      <div className="flex flex-wrap items-end justify-between gap-3">
        <BrowseChips
          filters={filters}
          groups={groups}
          onClear={(name) => set(name, '')}
          onClearAll={() => go({ sort, filters: {} })}
        />
        <Select
          className="ml-auto w-44"
          label="Order"
          value={sort}
          options={fractionSorts.map((each) => ({ value: each, label: sortWords[each] }))}
          onChange={(event) => go({ filters, sort: event.target.value as FractionSort })}
        />
      </div>
      <p role="status" className="sr-only">
        {data && !isValidating ? `${rows.length}${more ? ' or more' : ''} fractions` : 'Fetching'}
      </p>
      {error ? (
        <Notice
          kind="fails"
          title="The list did not come"
          live
          action={<Button onClick={() => mutate()}>Ask again</Button>}
        >
          {error.message}
        </Notice>
      ) : isLoading && !data ? (
        <Skeleton label="Fetching the fractions" lines={6} />
      ) : rows.length > 0 ? (
        <BrowseTable rows={rows} sort={sort} severalGroups={groups.length > 1} />
      ) : (
        <Nothing asked={asked} onClear={() => go({ sort, filters: {} })} />
      )}
      {more ? (
        <Button className="self-start" busy={isValidating} onClick={() => setSize(size + 1)}>
          More fractions
        </Button>
      ) : null}
    </div>
  );
}

function Nothing({ asked, onClear }: { asked: boolean; onClear: () => void }) {
  if (asked) {
    return (
      <EmptyState
        title="No fraction fits these filters."
        action={<Button onClick={onClear}>Clear all filters</Button>}
      >
        Take a filter off, or look for a shorter text.
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title="No fraction yet."
      action={
        <Link className={buttonClass('primary')} href="/runs">
          To the runs
        </Link>
      }
    >
      Fractions are started in a run, when a receiver is put on.
    </EmptyState>
  );
}
