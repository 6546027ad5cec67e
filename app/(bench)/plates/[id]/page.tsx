import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { factsOf, lanesForNewPhoto, marksOf } from '@/components/plates/facts';
import { LaneProfiles } from '@/components/plates/lane-profiles';
import { PlateAnswers } from '@/components/plates/plate-answers';
import { PlateMarker } from '@/components/plates/plate-marker';
import { PlatePhotos } from '@/components/plates/plate-photos';
import { buttonClass } from '@/components/ui/button-class';
import { PageHeader } from '@/components/ui/page-header';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { isId } from '@/lib/database/ids';
import { plateContext } from '@/lib/evidence/tlc/marking-context';

export const metadata: Metadata = { title: 'Plate' };

type Props = { params: Promise<{ id: string }>; searchParams: Promise<{ photo?: string }> };

export default async function PlatePage({ params, searchParams }: Props) {
  const actor = await requirePageActor();
  const { id } = await params;
  if (!isId(id)) notFound();
  const { plate, context } = await orPageNotFound(plateContext(actor, id));
  const wanted = (await searchParams).photo ?? plate.evidenceId;
  const evidence = context.photos.find((one) => one.id === wanted);
  const marked = plate.photos.find((one) => one.evidenceId === wanted) ?? null;
  const widthPx = evidence?.widthPx ?? 1;
  return (
    <>
      <PageHeader
        title="Plate"
        trail={[
          { href: '/runs', label: 'Runs' },
          { href: `/runs/${encodeURIComponent(plate.run)}`, label: plate.run },
        ]}
        sub={`${plate.stationaryPhase}; ${plate.eluent}`}
        actions={
          <Link href={`/plates/${plate.id}/report`} className={buttonClass('secondary')}>
            Report
          </Link>
        }
      />
      <PlatePhotos
        plate={plate}
        photos={context.photos}
        currentId={wanted}
        runCode={plate.run}
        disabledReason={context.whyNot}
      />
      {evidence ? (
        <PlateMarker
          key={`${wanted}-${plate.version}`}
          userId={actor.userId}
          runCode={plate.run}
          fractions={context.fractions}
          photo={{ ...evidence, widthPx, heightPx: evidence.heightPx ?? 1 }}
          first={{
            marks: marked ? marksOf(marked, widthPx) : lanesForNewPhoto(plate, widthPx),
            facts: factsOf(plate, marked),
          }}
          plate={{ id: plate.id, version: plate.version }}
          others={plate.photos.filter((photo) => photo.evidenceId !== wanted)}
          stillReason={context.whyNot}
        />
      ) : null}
      {marked ? <PlateAnswers photo={marked} /> : null}
      {marked?.corners ? (
        <LaneProfiles plateId={plate.id} evidenceId={marked.evidenceId} version={plate.version} />
      ) : null}
    </>
  );
}
