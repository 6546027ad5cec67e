'use client';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { EvidenceList } from '@/components/evidence/evidence-list';
import { EvidenceUploader } from '@/components/evidence/evidence-uploader';
import { buttonClass } from '@/components/ui/button-class';
import { EmptyState } from '@/components/ui/empty-state';
import type { EvidenceView } from '@/lib/evidence/schema';

type PhotoPickerProps = {
  runCode: string;
  photos: readonly EvidenceView[];
  /** The page that marks; the photo's id is added to it. */
  markHref: string;
  disabledReason: string | null;
};

/** Takes or chooses the photo that is to be marked. A photo that was just sent is opened for marking at once. */
export function PhotoPicker({ runCode, photos, markHref, disabledReason }: PhotoPickerProps) {
  const router = useRouter();
  const hrefOf = (id: string) => `${markHref}${markHref.includes('?') ? '&' : '?'}photo=${id}`;
  return (
    <div className="flex flex-col gap-6">
      <EvidenceUploader
        runCode={runCode}
        kind="plate-photo"
        disabledReason={disabledReason}
        onStored={({ evidence }) => router.push(hrefOf(evidence.id))}
      />
      <section aria-labelledby="photos-heading">
        <h2 id="photos-heading" className="mb-3 text-lg">
          Plate photos of this run
        </h2>
        <EvidenceList
          items={photos}
          empty={
            <EmptyState title="No plate photo yet.">
              Photograph the plate straight from above, filling the picture, under the lamp or after staining.
            </EmptyState>
          }
          actionFor={({ id, fileName }) => (
            <Link href={hrefOf(id)} className={buttonClass('secondary')} aria-label={`Mark ${fileName}`}>
              Mark
            </Link>
          )}
        />
      </section>
    </div>
  );
}
