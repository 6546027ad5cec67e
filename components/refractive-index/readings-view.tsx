'use client';
import useSWR from 'swr';
import { EmptyState } from '@/components/ui/empty-state';
import { Skeleton } from '@/components/ui/skeleton';
import { sayDone } from '@/components/ui/toaster';
import type { RefractiveReadingJson } from '@/lib/evidence/refractive-index/schema';
import { fetcher } from '@/lib/http/client';
import { ReadingCard } from './reading-card';
import { ReadingForm } from './reading-form';

type Page = { items: RefractiveReadingJson[]; nextCursor: string | null };
type ReadingsViewProps = { fractionCode: string; disabledReason: string | null };

/** The form and, beside or under it, every set of readings of the fraction; none is ever changed. */
export function ReadingsView({ fractionCode, disabledReason }: ReadingsViewProps) {
  const path = `/api/v1/fractions/${encodeURIComponent(fractionCode)}/refractive-readings?limit=200`;
  const { data, mutate } = useSWR<Page>(path, fetcher);
  return (
    <div className="grid gap-8 lg:grid-cols-2">
      <section aria-labelledby="enter-title">
        <h2 id="enter-title" className="mb-3 text-lg">
          Enter readings
        </h2>
        <ReadingForm
          fractionCode={fractionCode}
          disabledReason={disabledReason}
          onSaved={(saved) => {
            sayDone(`Saved: ${saved.state}`);
            void mutate();
          }}
        />
      </section>
      <section aria-labelledby="results-title" aria-live="polite" className="flex flex-col gap-4">
        <h2 id="results-title" className="text-lg">
          What they say
        </h2>
        {!data ? <Skeleton label="Fetching the readings" lines={5} /> : null}
        {data?.items.length === 0 ? (
          <EmptyState title="No reading yet.">
            Read pure water first, then the sample at least three times, and enter all of it here.
          </EmptyState>
        ) : null}
        {data?.items.map((reading, at) => (
          <ReadingCard key={reading.id} reading={reading} judged={at === 0} />
        ))}
      </section>
    </div>
  );
}
