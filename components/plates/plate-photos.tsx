'use client';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { EvidenceUploader } from '@/components/evidence/evidence-uploader';
import { Photo } from '@/components/evidence/photo';
import { Notice } from '@/components/ui/notice';
import type { EvidenceView } from '@/lib/evidence/schema';
import type { PlateView } from '@/lib/evidence/tlc/schema';
import { visualiserName } from '@/lib/evidence/tlc/visualiser-name';

type PlatePhotosProps = {
  plate: PlateView;
  photos: readonly EvidenceView[];
  currentId: string;
  runCode: string;
  disabledReason: string | null;
};

/** The photos of a plate, one under each visualiser, and a way to add another. */
export function PlatePhotos({ plate, photos, currentId, runCode, disabledReason }: PlatePhotosProps) {
  const router = useRouter();
  const hrefOf = (id: string) => `/plates/${plate.id}?photo=${id}`;
  const current = plate.photos.find((photo) => photo.evidenceId === currentId);
  return (
    <div className="mb-6 flex flex-col gap-4">
      <nav aria-label="Photos of this plate">
        <ul className="flex flex-wrap gap-2">
          {plate.photos.map((photo) => {
            const evidence = photos.find((one) => one.id === photo.evidenceId);
            return (
              <li key={photo.id}>
                <Link
                  href={hrefOf(photo.evidenceId)}
                  aria-current={photo.evidenceId === currentId ? 'page' : undefined}
                  className="flex min-h-target items-center gap-3 rounded border border-line-strong bg-paper-raised py-1 pr-4 pl-1 font-bold aria-[current]:border-glass aria-[current]:bg-glass-wash"
                >
                  {evidence ? (
                    <Photo evidence={evidence} alt="" sizes="3rem" className="h-12 w-9 object-cover" />
                  ) : null}
                  {visualiserName(photo.visualiser)}
                </Link>
              </li>
            );
          })}
          {current ? null : (
            <li
              aria-current="page"
              className="flex min-h-target items-center rounded border border-dashed border-glass bg-glass-wash px-4 font-bold"
            >
              New photo
            </li>
          )}
        </ul>
      </nav>
      {current ? (
        <p className="text-sm text-ink-soft">
          {current.flags.length > 0 ? `Flags of this photo: ${current.flags.join(', ')}.` : 'No flags.'}
          {current.units === 'mm'
            ? ' Its saved marks are in millimetres on the plate, not places in the photo.'
            : ''}
        </p>
      ) : (
        <Notice title="This photo is new to the plate">
          The lanes are those of the other photos. Mark the lines and spots as this photo shows them, then
          save.
        </Notice>
      )}
      <details className="rounded border border-line px-4 py-1">
        <summary className="flex min-h-target items-center font-bold">
          Add a photo of the same plate under another lamp or stain
        </summary>
        <div className="pt-2 pb-3">
          <EvidenceUploader
            runCode={runCode}
            kind="plate-photo"
            disabledReason={disabledReason}
            onStored={({ evidence }) => {
              router.push(hrefOf(evidence.id));
              router.refresh();
            }}
          />
        </div>
      </details>
    </div>
  );
}
