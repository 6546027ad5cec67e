import type { Metadata } from 'next';
import { notFound as pageNotFound } from 'next/navigation';
import { FractionForm } from '@/components/runs/fraction-form';
import { StateMark } from '@/components/states/state-mark';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { presentFraction } from '@/lib/distillation/present';
import { requireFraction } from '@/lib/distillation/require-fraction';

type Params = { params: Promise<{ code: string; number: string }> };

export async function generateMetadata({ params }: Params): Promise<Metadata> {
  const { code, number } = await params;
  return { title: `Facts of ${code}-F${number}` };
}

export default async function FractionFactsPage({ params }: Params) {
  const actor = await requirePageActor();
  const { code, number } = await params;
  if (!/^\d{1,6}$/.test(number)) pageNotFound();
  const fraction = await orPageNotFound(requireFraction(actor, `${code}-F${number}`));
  return (
    <>
      <PageHeader
        title={`Facts of ${fraction.code}`}
        state={<StateMark state={fraction.status} />}
        trail={[
          { href: '/runs', label: 'Runs' },
          { href: `/runs/${code}`, label: code },
          { href: `/fractions/${fraction.code}`, label: fraction.code },
        ]}
        sub={`${fraction.compound.name}, collected by ${fraction.collectedBy.name}`}
      />
      <FractionForm
        key={fraction.version}
        runCode={code}
        fraction={presentFraction(fraction)}
        disabledReason={whyNot(actor, 'fraction.write', fraction.groupId)}
      />
    </>
  );
}
