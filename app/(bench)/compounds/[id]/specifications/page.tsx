import type { Metadata } from 'next';
import { SheetSection } from '@/components/ui/sheet-section';
import { EditionList } from '@/components/specifications/edition-list';
import { SpecificationForm } from '@/components/specifications/specification-form';
import { PageHeader } from '@/components/ui/page-header';
import { listSpecifications } from '@/lib/acceptance/list-specifications';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { requireCompound } from '@/lib/compounds/require-compound';

export const metadata: Metadata = { title: 'Specifications' };

export default async function SpecificationsPage({ params }: { params: Promise<{ id: string }> }) {
  const actor = await requirePageActor();
  const { id } = await params;
  const compound = await orPageNotFound(requireCompound(id));
  const { items } = await orPageNotFound(listSpecifications(actor, id, { limit: 100 }));
  const groups = actor.memberships
    .filter((one) => one.role === 'pi')
    .map(({ groupId, groupName }) => ({ id: groupId, name: groupName }));
  return (
    <>
      <PageHeader
        title="Specifications"
        trail={[
          { href: '/compounds', label: 'Compounds' },
          { href: `/compounds/${id}`, label: compound.name },
        ]}
        sub={`What a fraction of ${compound.name} has to show before it can be signed off`}
      />
      <SheetSection id="editions" title="Editions">
        <EditionList
          editions={items}
          whyNotApprove={(groupId) => whyNot(actor, 'specification.write', groupId)}
        />
      </SheetSection>
      <SheetSection id="write" title="Write a new edition">
        <SpecificationForm
          compoundId={id}
          groups={groups}
          whyNot={groups.length > 0 ? null : 'Only a PI can write a specification.'}
        />
      </SheetSection>
    </>
  );
}
