import type { Metadata } from 'next';
import { PhotoPicker } from '@/components/plates/photo-picker';
import { PlateMarker } from '@/components/plates/plate-marker';
import { noFacts } from '@/components/plates/facts';
import { noMarks } from '@/components/plates/marks';
import { WaitingSavesNotice } from '@/components/plates/waiting-saves-notice';
import { PageHeader } from '@/components/ui/page-header';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { markingContext } from '@/lib/evidence/tlc/marking-context';

export const metadata: Metadata = { title: 'New plate' };

type Props = { params: Promise<{ code: string }>; searchParams: Promise<{ photo?: string }> };

export default async function NewPlatePage({ params, searchParams }: Props) {
  const actor = await requirePageActor();
  const code = decodeURIComponent((await params).code);
  const { photo: photoId } = await searchParams;
  const context = await orPageNotFound(markingContext(actor, code));
  const photo = context.photos.find((one) => one.id === photoId);
  const here = `/runs/${encodeURIComponent(code)}/plates/new`;
  return (
    <>
      <PageHeader
        title={photo ? 'Mark the plate' : 'New plate'}
        trail={[
          { href: '/runs', label: 'Runs' },
          { href: `/runs/${encodeURIComponent(code)}`, label: code },
          ...(photo ? [{ href: here, label: 'New plate' }] : []),
        ]}
        sub={photo ? photo.fileName : `Run of ${context.run.target}. First the photo, then its marks.`}
      />
      {photo ? (
        <PlateMarker
          key={photo.id}
          userId={actor.userId}
          runCode={code}
          fractions={context.fractions}
          photo={{ ...photo, widthPx: photo.widthPx ?? 1, heightPx: photo.heightPx ?? 1 }}
          first={{ marks: noMarks, facts: noFacts }}
          plate={null}
          stillReason={context.whyNot}
        />
      ) : (
        <div className="flex flex-col gap-6">
          <WaitingSavesNotice userId={actor.userId} />
          <PhotoPicker
            runCode={code}
            photos={context.photos}
            markHref={here}
            disabledReason={context.whyNot}
          />
        </div>
      )}
    </>
  );
}
