import type { Metadata } from 'next';
import type { ReactNode } from 'react';
import { CompoundDialog } from '@/components/compounds/compound-dialog';
import { HazardsPanel } from '@/components/compounds/hazards-panel';
import { IdentityPanel } from '@/components/compounds/identity-panel';
import { LiteratureDialog } from '@/components/compounds/literature-dialog';
import { LiteratureProperty } from '@/components/compounds/literature-property';
import { PlatePanel } from '@/components/compounds/plate-panel';
import { PurityTrend } from '@/components/compounds/purity-trend';
import { SpecificationSection } from '@/components/compounds/specification-section';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { listSpecifications } from '@/lib/acceptance/list-specifications';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { listAllLiterature } from '@/lib/compounds/list-literature';
import { LITERATURE_PROPERTY_NAMES } from '@/lib/compounds/property-names';
import { listPurityTrend } from '@/lib/compounds/purity-trend';
import { readCompound } from '@/lib/compounds/read-compound';

type Params = { params: Promise<{ id: string }> };

export const metadata: Metadata = { title: 'Compound' };

export default async function CompoundPage({ params }: Params) {
  const actor = await requirePageActor();
  const { id } = await params;
  const compound = await orPageNotFound(readCompound(actor, id));
  const [literature, points, specifications] = await Promise.all([
    listAllLiterature(actor, id),
    listPurityTrend(actor, id),
    listSpecifications(actor, id, { limit: 100 }),
  ]);
  const inForce = specifications.items.filter((edition) => edition.inForce);
  const mayWrite = actor.memberships.some(({ role }) => role === 'pi');
  const whyNotWrite = whyNot(actor, 'compound.write', null);
  return (
    <>
      <PageHeader
        title={compound.name}
        trail={[{ href: '/compounds', label: 'Compounds' }]}
        sub={compound.synonyms.slice(0, 3).join(', ')}
        actions={<CompoundDialog compound={compound} disabledReason={whyNotWrite} />}
      />
      <div className="grid grid-cols-1 gap-x-10 gap-y-8 lg:grid-cols-2">
        <Section title="Identity">
          <IdentityPanel compound={compound} />
        </Section>
        <div className="flex min-w-0 flex-col gap-8">
          <Section title="Hazards">
            <HazardsPanel hazards={compound.hazards} />
          </Section>
          <Section title="Purity over runs">
            <PurityTrend points={points} inForce={inForce} />
          </Section>
        </div>
        <Section title="Literature values" wide>
          <LiteratureDialog compoundId={id} disabledReason={whyNotWrite} />
          {literature.length === 0 ? (
            <EmptyState title="No literature value is kept.">
              Measurements of this compound cannot be compared with anything until a PI adds its boiling point
              and refractive index with their sources.
            </EmptyState>
          ) : (
            <div className="mt-3 grid gap-x-10 lg:grid-cols-2">
              {LITERATURE_PROPERTY_NAMES.map((property) => {
                const values = literature.filter((value) => value.property === property);
                return values.length === 0 ? null : (
                  <LiteratureProperty key={property} compoundId={id} {...{ property, values, whyNotWrite }} />
                );
              })}
            </div>
          )}
        </Section>
        <Section title="On a plate">
          <PlatePanel plate={compound.plate} />
        </Section>
        <Section title="Specification">
          <SpecificationSection compoundId={id} name={compound.name} inForce={inForce} mayWrite={mayWrite} />
        </Section>
      </div>
    </>
  );
}

function Section({ title, wide = false, children }: { title: string; wide?: boolean; children: ReactNode }) {
  return (
    <section className={`min-w-0 ${wide ? 'lg:col-span-2' : ''}`}>
      <h2 className="mb-3 text-xl">{title}</h2>
      {children}
    </section>
  );
}
