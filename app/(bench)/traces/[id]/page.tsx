import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { TraceView } from '@/components/gc/trace-view';
import { PageHeader } from '@/components/ui/page-header';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { isId } from '@/lib/database/ids';
import { readTracePage } from '@/lib/evidence/gc/queries';

export const metadata: Metadata = { title: 'GC trace' };

export default async function TracePage({ params }: { params: Promise<{ id: string }> }) {
  const actor = await requirePageActor();
  const { id } = await params;
  if (!isId(id)) notFound();
  const { trace, whyNotWrite } = await orPageNotFound(readTracePage(actor, id));
  const trail = [
    { href: `/runs/${encodeURIComponent(trace.run)}`, label: trace.run },
    ...(trace.fraction
      ? [{ href: `/fractions/${encodeURIComponent(trace.fraction)}`, label: trace.fraction }]
      : []),
  ];
  return (
    <>
      <PageHeader
        trail={trail}
        title={`GC trace, ${trace.detector}`}
        sub={`${trace.fraction ?? `${trace.subject} of ${trace.run}`}; ${trace.evidence.fileName}`}
      />
      <TraceView initial={trace} whyNotWrite={whyNotWrite} />
    </>
  );
}
