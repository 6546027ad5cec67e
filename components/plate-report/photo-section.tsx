import { PlateDrawing } from '@/components/plate-report/plate-drawing';
import { SpotRows } from '@/components/plate-report/spot-rows';
import type { ReportPhoto } from '@/lib/evidence/tlc/plate-report';

function Words({ title, words }: { title: string; words: readonly string[] }) {
  if (words.length === 0) return null;
  return (
    <>
      <h3 className="mt-4 text-lg">{title}</h3>
      <ul className="list-disc pl-5">
        {[...new Set(words)].map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
    </>
  );
}

function proposalWords({ photo }: ReportPhoto): string | null {
  if (!photo.proposal) return null;
  const { accepted, moved, added, removed } = photo.proposal;
  return `Marks proposed from the photo: ${accepted} accepted as they were, ${moved} moved, ${removed} removed, ${added} added by hand.`;
}

/** One photo of the plate on the report: picture, Rf table, and what the lanes say. */
export function PhotoSection({ report }: { report: ReportPhoto }) {
  const { photo, visualiser, pictureHref, isRectified, marks, fileName, sha256 } = report;
  const proposed = proposalWords(report);
  return (
    <section aria-label={visualiser} className="mt-8">
      <h2 className="text-xl">{visualiser}</h2>
      {photo.flags.length > 0 ? (
        <p className="font-bold text-needs">Flags of this photo: {photo.flags.join(', ')}.</p>
      ) : null}
      <div className="mt-3 grid gap-6 lg:grid-cols-[minmax(0,22rem)_minmax(0,1fr)] print:grid-cols-[60mm_minmax(0,1fr)]">
        <figure>
          <PlateDrawing
            href={pictureHref}
            marks={marks}
            label={`Plate under ${visualiser}, with its marks`}
          />
          <figcaption className="mt-1 text-sm text-ink-soft">
            {isRectified
              ? 'Freed of perspective by the four corners.'
              : 'As photographed: no corners are marked, so perspective is not corrected.'}{' '}
            Line: baseline; dashed: solvent front. {fileName}, SHA-256{' '}
            <span className="font-mono break-all">{sha256}</span>
          </figcaption>
        </figure>
        <div>
          <SpotRows photo={photo} />
          <Words title="Against references on this plate" words={photo.comparisons.map((one) => one.words)} />
          <Words title="Before and after" words={photo.beforeAfter.flatMap((one) => one.words)} />
          {proposed ? <p className="mt-4 text-sm text-ink-soft">{proposed}</p> : null}
        </div>
      </div>
    </section>
  );
}
