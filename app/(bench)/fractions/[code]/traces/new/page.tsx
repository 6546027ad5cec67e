import type { Metadata } from 'next';
import { NewTrace } from '@/components/gc/new-trace';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { requireFraction } from '@/lib/distillation/require-fraction';
import { listTraceFiles } from '@/lib/evidence/gc/queries';

export const metadata: Metadata = { title: 'Read a GC trace' };

type Props = { params: Promise<{ code: string }>; searchParams: Promise<{ evidence?: string | string[] }> };

export default async function NewTracePage({ params, searchParams }: Props) {
  const actor = await requirePageActor();
  const code = decodeURIComponent((await params).code);
  const fraction = await orPageNotFound(requireFraction(actor, code));
  const files = await listTraceFiles(actor, fraction);
  const { evidence } = await searchParams;
  const asked = files.find((file) => file.id === evidence)?.id ?? null;
  return (
    <>
      <PageHeader
        trail={[
          { href: `/runs/${encodeURIComponent(fraction.run.code)}`, label: fraction.run.code },
          { href: `/fractions/${encodeURIComponent(code)}`, label: code },
        ]}
        title="Read a GC trace"
        sub={`${code}, ${fraction.compound.name}`}
      />
      <NewTrace
        fractionCode={code}
        runCode={fraction.run.code}
        files={files}
        initialFileId={asked}
        whyNotWrite={whyNot(actor, 'trace.write', fraction.groupId)}
      />
    </>
  );
}
