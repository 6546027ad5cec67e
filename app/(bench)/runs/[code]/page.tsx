import type { Metadata } from 'next';
import { ActionLink } from '@/components/runs/action-link';
import { CautionsList } from '@/components/runs/cautions-list';
import { EndRun } from '@/components/runs/end-run';
import { FractionsTable } from '@/components/runs/fractions-table';
import { MassBalanceView } from '@/components/runs/mass-balance-view';
import { PlatesList } from '@/components/runs/plates-list';
import { ReadingsPanel } from '@/components/runs/readings-panel';
import { RunFacts } from '@/components/runs/run-facts';
import { RunStrip } from '@/components/runs/run-strip';
import { SheetSection } from '@/components/ui/sheet-section';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { findRunSheet } from '@/lib/distillation/run-sheet';

type Params = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Params): Promise<Metadata> {
  return { title: `Run ${(await params).code}` };
}

export default async function RunPage({ params }: Params) {
  const actor = await requirePageActor();
  const sheet = await orPageNotFound(findRunSheet(actor, (await params).code));
  const { run, fractions, plates, balance } = sheet;
  const here = `/runs/${run.code}`;
  const noFraction = whyNot(actor, 'fraction.write', run.group.id);
  const noEnd =
    whyNot(actor, 'run.write', run.group.id) ?? (run.endedAt ? 'This run has ended already.' : null);
  const start = (
    <ActionLink href={`${here}/fractions/new`} reason={noFraction} variant="primary">
      Start a fraction
    </ActionLink>
  );
  const edit = (
    <ActionLink href={`${here}/edit`} reason={whyNot(actor, 'run.write', run.group.id)}>
      Edit the run
    </ActionLink>
  );
  const weighResidue = (
    <ActionLink href={`${here}/edit#residue`} reason={whyNot(actor, 'run.write', run.group.id)}>
      {run.residueMassG === null ? 'Enter the residue' : 'Correct the residue'}
    </ActionLink>
  );
  const addPlate = (
    <ActionLink href={`${here}/plates/new`} reason={whyNot(actor, 'plate.write', run.group.id)}>
      Add a plate
    </ActionLink>
  );
  return (
    <>
      <PageHeader
        title={run.code}
        trail={[{ href: '/runs', label: 'Runs' }]}
        sub={`${run.targetCompound.name} by ${run.chemist.name}, ${run.group.name}${run.endedAt ? '' : ' · still running'}`}
        actions={
          <>
            {start}
            {run.endedAt ? null : (
              <ActionLink href="#readings" reason={null}>
                Note a reading
              </ActionLink>
            )}
            <ActionLink
              href={`${here}/labels`}
              reason={fractions.length > 0 ? null : 'Labels come with the first fraction.'}
            >
              Labels
            </ActionLink>
            <EndRun run={run} disabledReason={noEnd} key={run.version} />
          </>
        }
      />
      <SheetSection id="cuts" title="Cuts">
        {fractions.length > 0 ? (
          <RunStrip sheet={sheet} />
        ) : (
          <EmptyState title="No receiver yet." action={start}>
            Start a fraction when the first receiver is put on; weigh it empty before.
          </EmptyState>
        )}
      </SheetSection>
      {fractions.length > 0 ? (
        <SheetSection id="fractions" title="Fractions">
          <FractionsTable fractions={fractions} mayChange={noFraction === null} />
        </SheetSection>
      ) : null}
      <SheetSection id="readings" title="Readings">
        <ReadingsPanel runCode={run.code} entryReason={whyNot(actor, 'readings.write', run.group.id)} />
      </SheetSection>
      <SheetSection id="balance" title="Mass balance" action={weighResidue}>
        <MassBalanceView balance={balance} chargeMassG={run.chargeMassG} />
      </SheetSection>
      <SheetSection id="plates" title="Plates">
        <PlatesList plates={plates} action={addPlate} />
      </SheetSection>
      <SheetSection id="facts" title="The run" action={edit}>
        <RunFacts run={run} expected={sheet.expected} />
      </SheetSection>
      <CautionsList cautions={sheet.cautions} />
    </>
  );
}
