import type { Metadata } from 'next';
import { FractionForm } from '@/components/runs/fraction-form';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { requireRun } from '@/lib/distillation/require-run';

export const metadata: Metadata = { title: 'Start a fraction' };

type Params = { params: Promise<{ code: string }> };

export default async function NewFractionPage({ params }: Params) {
  const actor = await requirePageActor();
  const run = await orPageNotFound(requireRun(actor, (await params).code));
  return (
    <>
      <PageHeader
        title="Start a fraction"
        trail={[
          { href: '/runs', label: 'Runs' },
          { href: `/runs/${run.code}`, label: run.code },
        ]}
        sub={`${run.target.name}. What is not known yet can be added when the receiver comes off.`}
      />
      <FractionForm
        runCode={run.code}
        fraction={null}
        disabledReason={whyNot(actor, 'fraction.write', run.groupId)}
      />
    </>
  );
}
