import type { Metadata } from 'next';
import { ReadingsView } from '@/components/refractive-index/readings-view';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { whyNotInState } from '@/lib/distillation/fraction-states';
import { requireFraction } from '@/lib/distillation/require-fraction';

export const metadata: Metadata = { title: 'Refractive index' };

export default async function RefractiveIndexPage({ params }: { params: Promise<{ code: string }> }) {
  const actor = await requirePageActor();
  const code = decodeURIComponent((await params).code);
  const fraction = await orPageNotFound(requireFraction(actor, code));
  const disabledReason =
    whyNot(actor, 'refractiveIndex.write', fraction.groupId) ?? whyNotInState('change', fraction.status);
  return (
    <>
      <PageHeader
        trail={[
          { href: `/runs/${encodeURIComponent(fraction.run.code)}`, label: fraction.run.code },
          { href: `/fractions/${encodeURIComponent(code)}`, label: code },
        ]}
        title="Refractive index"
        sub={`${code}, ${fraction.compound.name}`}
      />
      <ReadingsView fractionCode={code} disabledReason={disabledReason} />
    </>
  );
}
