'use client';
import { Button } from '@/components/ui/button';
import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';
import { visualiserName } from '@/lib/evidence/tlc/visualiser-name';
import { type Ghost, linesFrom } from './ghosts';
import type { MarksHandle } from './use-marks';

type GhostListProps = {
  handle: MarksHandle;
  ghosts: readonly Ghost[];
  others: readonly PlatePhotoView[];
  still: boolean;
};

/** What other photos of the plate show, in words, and their lines to be taken over. */
export function GhostList({ handle, ghosts, others, still }: GhostListProps) {
  const { state, dispatch, size } = handle;
  if (others.length === 0) return null;
  if (state.marks.corners.length < 4)
    return (
      <p className="mt-2 text-sm text-ink-soft">
        Mark the four corners here and in the other photos: then spots of one are shown in the others.
      </p>
    );
  const sources = others.flatMap((photo) => {
    const marks = still ? null : linesFrom(photo, state.marks, size);
    return marks ? [{ photo, marks }] : [];
  });
  return (
    <div className="mt-2 flex flex-col gap-2 text-sm">
      {ghosts.length > 0 ? (
        <p>
          Hollow diamonds, seen in other photos:{' '}
          {ghosts
            .map(({ label, rf, visualiser }) => `lane ${label}, Rf ${rf.toFixed(2)} (${visualiser})`)
            .join('; ')}
          .
        </p>
      ) : null}
      {sources.map(({ photo, marks }) => (
        <span key={photo.id}>
          <Button onClick={() => dispatch({ type: 'takeOver', marks })}>
            Take lines and lanes from {visualiserName(photo.visualiser)}
          </Button>
        </span>
      ))}
    </div>
  );
}
