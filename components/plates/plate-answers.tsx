import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';

/** What the spots of a photo say, in words: what agrees with which reference, and the crude against each fraction. */
export function PlateAnswers({ photo }: { photo: PlatePhotoView }) {
  const { comparisons, beforeAfter, proposal } = photo;
  if (comparisons.length === 0 && beforeAfter.length === 0 && !proposal) return null;
  return (
    <div className="mt-8 grid gap-6 lg:grid-cols-2">
      {comparisons.length > 0 ? (
        <section aria-labelledby="comparisons-heading">
          <h2 id="comparisons-heading" className="mb-2 text-lg">
            Against the references
          </h2>
          <ul className="flex flex-col gap-2">
            {comparisons.map((one) => (
              <li key={`${one.laneId} ${one.spotIndex}`}>{one.words}</li>
            ))}
          </ul>
        </section>
      ) : null}
      {beforeAfter.length > 0 ? (
        <section aria-labelledby="before-after-heading">
          <h2 id="before-after-heading" className="mb-2 text-lg">
            Before and after
          </h2>
          {beforeAfter.map((one) => (
            <div key={`${one.crude.laneId} ${one.fraction.laneId}`} className="mb-4">
              <h3>
                {one.crude.label} against {one.fraction.code ?? one.fraction.label}
              </h3>
              <ul className="list-disc pl-5">
                {one.words.map((words) => (
                  <li key={words}>{words}</li>
                ))}
              </ul>
            </div>
          ))}
        </section>
      ) : null}
      {proposal ? (
        <p className="text-sm text-ink-soft lg:col-span-2">
          Of the marks that were proposed for this photo {proposal.accepted} were accepted, {proposal.moved}{' '}
          moved and {proposal.removed} taken away; {proposal.added} were added by hand.
        </p>
      ) : null}
    </div>
  );
}
