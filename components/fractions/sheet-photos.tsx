import Link from 'next/link';
import { findVisualiser } from '@/lib/evidence/tlc/visualisers';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

type Plate = FractionSheet['plates'][number];

/** Rf of the fraction's spots under one photo, in words. */
function spotsUnder(plate: Plate, photoId: string): string {
  return plate.lanes
    .map((lane) => {
      const spots = lane.spots.filter((spot) => spot.photoId === photoId);
      const values = spots.map(
        (spot) => `${spot.rf.toFixed(2)} ± ${(2 * spot.rfUncertainty).toFixed(2)} (k = 2)`,
      );
      return `lane ${lane.label}: ${values.length > 0 ? `Rf ${values.join(', ')}` : 'no spot'}`;
    })
    .join('; ');
}

type SheetPhotosProps = {
  plates: Plate[];
  /** Off on a shared page, whose reader has no account. */
  linked?: boolean;
  /** Under which the small pictures are found; a shared page has its own. */
  pictureHref: (evidenceId: string) => string;
};

/** Plate photos with the fraction's lanes. */
export function SheetPhotos({ plates, linked = true, pictureHref }: SheetPhotosProps) {
  const photos = plates.flatMap((plate) => plate.photos.map((photo) => ({ plate, photo })));
  if (photos.length === 0)
    return <p className="text-ink-soft">No marked plate photo has a lane of this fraction yet.</p>;
  return (
    <ul className="grid grid-cols-1 gap-4 sm:grid-cols-2">
      {photos.map(({ plate, photo }) => {
        const name = findVisualiser(photo.visualiser)?.name ?? photo.visualiser;
        const picture = (
          // eslint-disable-next-line @next/next/no-img-element -- our own preview, of the right size already
          <img
            src={pictureHref(photo.evidenceId)}
            alt={`Plate under ${name}`}
            loading="lazy"
            className="h-48 w-full bg-paper-sunk object-contain"
          />
        );
        return (
          <li key={photo.id}>
            <figure className="overflow-hidden rounded border border-line bg-paper-raised">
              {linked ? <Link href={`/plates/${plate.id}`}>{picture}</Link> : picture}
              <figcaption className="px-3 py-2">
                <p className="font-bold">{name}</p>
                <p>{spotsUnder(plate, photo.id)}</p>
                <p className="text-sm text-ink-soft">
                  {plate.stationaryPhase}; {plate.eluent}
                </p>
                {photo.flags.map((flag) => (
                  <p key={flag} className="text-sm text-needs">
                    {flag}
                  </p>
                ))}
              </figcaption>
            </figure>
          </li>
        );
      })}
    </ul>
  );
}
