import type { Metadata } from 'next';
import { RunEditForm } from '@/components/runs/run-edit-form';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { findRunToEdit } from '@/lib/distillation/find-run-to-edit';

type Params = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Params): Promise<Metadata> {
  return { title: `Edit ${(await params).code}` };
}

export default async function EditRunPage({ params }: Params) {
  const actor = await requirePageActor();
  const { run, signedOff } = await orPageNotFound(findRunToEdit(actor, (await params).code));
  return (
    <>
      <PageHeader
        title={`Edit ${run.code}`}
        trail={[
          { href: '/runs', label: 'Runs' },
          { href: `/runs/${run.code}`, label: run.code },
        ]}
        sub={`${run.targetCompound.name} by ${run.chemist.name}, ${run.group.name}`}
      />
      <RunEditForm
        run={run}
        signedOff={signedOff}
        disabledReason={whyNot(actor, 'run.write', run.group.id)}
      />
    </>
  );
}
