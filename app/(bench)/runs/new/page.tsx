import type { Metadata } from 'next';
import { RunForm } from '@/components/runs/run-form';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/page-actor';
import { groupsWhereChemist } from '@/lib/distillation/policy';

export const metadata: Metadata = { title: 'New run' };

export default async function NewRunPage() {
  const groups = groupsWhereChemist(await requirePageActor());
  const reason =
    groups.length > 0 ? null : 'Only a chemist can start a run. Ask a PI or an administrator for that role.';
  return (
    <>
      <PageHeader
        title="New run"
        trail={[{ href: '/runs', label: 'Runs' }]}
        sub="One distillation: a charge, a still, its receivers"
      />
      <RunForm groups={groups} disabledReason={reason} />
    </>
  );
}
