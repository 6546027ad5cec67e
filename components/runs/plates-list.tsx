import Link from 'next/link';
import { EmptyState } from '@/components/ui/empty-state';
import { findVisualiser } from '@/lib/evidence/tlc/visualisers';
import type { RunSheet } from '@/lib/distillation/run-sheet';
import { LocalTime } from './local-time';

/** The plates of a run, photo first. */
export function PlatesList({ plates, action }: { plates: RunSheet['plates']; action: React.ReactNode }) {
  if (plates.length === 0) {
    return (
      <EmptyState title="No plate yet." action={action}>
        Photograph a developed plate and mark its baseline, front, lanes and spots: the Rf values are computed
        from that.
      </EmptyState>
    );
  }
  return (
    <>
      <ul className="grid grid-cols-2 gap-4 sm:grid-cols-3 lg:grid-cols-5">
        {plates.map((plate) => (
          <li key={plate.id}>
            <Link
              href={`/plates/${plate.id}`}
              className="flex h-full flex-col gap-2 rounded border border-line bg-paper-raised p-3 hover:border-glass"
            >
              {plate.photo ? (
                // Re-encoded by our own preview route, so the image loader has nothing to add.
                // eslint-disable-next-line @next/next/no-img-element
                <img
                  src={`/api/v1/evidence/${plate.photo}/preview?width=320`}
                  alt=""
                  className="h-40 w-full rounded-sm bg-paper-sunk object-contain"
                />
              ) : null}
              <span className="font-bold">{plate.stationaryPhase}</span>
              <span className="text-sm text-ink-soft">
                {plate.eluent}
                {plate.visualisers.length > 0
                  ? ` · ${plate.visualisers.map((id) => findVisualiser(id)?.name ?? id).join(', ')}`
                  : ''}
              </span>
              <span className="text-sm text-ink-soft">
                <LocalTime at={plate.createdAt} />
              </span>
            </Link>
          </li>
        ))}
      </ul>
      <div className="mt-4">{action}</div>
    </>
  );
}
