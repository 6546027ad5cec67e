import type { Metadata } from 'next';
import { StillPlanner } from '@/components/still-planner/still-planner';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Still planner' };

export default async function StillPlannerPage() {
  await requirePageActor();
  return (
    <>
      <PageHeader
        title="Still planner"
        sub="Each answer says its method, its uncertainty and its source. Nothing here is saved."
      />
      <StillPlanner />
    </>
  );
}
