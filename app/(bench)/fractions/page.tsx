import type { Metadata } from 'next';
import { Suspense } from 'react';
import { BrowseView } from '@/components/fractions/browse-view';
import { PageHeader } from '@/components/ui/page-header';
import { Skeleton } from '@/components/ui/skeleton';
import { presentActor } from '@/lib/accounts/present';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Fractions' };

export default async function FractionsPage() {
  const groups = presentActor(await requirePageActor()).groups ?? [];
  return (
    <>
      <PageHeader title="Fractions" sub="Find a receiver by compound, run, verdict or place" />
      <Suspense fallback={<Skeleton label="Fetching the fractions" lines={6} />}>
        <BrowseView groups={groups.map(({ id, name }) => ({ id, name }))} />
      </Suspense>
    </>
  );
}
