'use client';
import { type KeyboardEvent, useMemo } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';
import { DraftNotice } from './draft-notice';
import type { Facts } from './facts';
import { FactsFields } from './facts-fields';
import type { RunFraction } from './lane-editor';
import { LaneList } from './lane-list';
import type { Marks } from './marks';
import { PhotoPart } from './photo-part';
import { SaveStates } from './save-states';
import { SpotTable } from './spot-table';
import { UnsureSaveDialog } from './unsure-save-dialog';
import { useMarks } from './use-marks';
import { usePlateSaving } from './use-plate-saving';

export type PlateMarkerProps = {
  /** Whose marks are kept on the device. */
  userId: string;
  runCode: string;
  fractions: readonly RunFraction[];
  photo: { id: string; fileName: string; widthPx: number; heightPx: number };
  first: { marks: Marks; facts: Facts };
  /** The saved plate that is changed; null for a new one. */
  plate: { id: string; version: number } | null;
  /** The other photos of the plate, as they are saved. */
  others?: readonly PlatePhotoView[];
  /** Why the marks may only be looked at. */
  stillReason: string | null;
};

/** Marks a plate photo: lines, lanes and spots on the picture, what they are beside it, Rf as it goes, and saves it. */
export function PlateMarker(props: PlateMarkerProps) {
  const { userId, runCode, fractions, photo, first, plate, others = [], stillReason } = props;
  const extent = useMemo(() => ({ width: photo.widthPx, height: photo.heightPx }), [photo]);
  const handle = useMarks({ userId, evidenceId: photo.id }, extent, first);
  const { state, dispatch, facts, measured } = handle;
  const saving = usePlateSaving({ userId, runCode, photo, plate }, handle);
  const still = stillReason !== null;

  function onKeyDown(event: KeyboardEvent) {
    if (still || !(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'z') return;
    if (event.target instanceof HTMLInputElement || event.target instanceof HTMLTextAreaElement) return;
    event.preventDefault();
    dispatch({ type: event.shiftKey ? 'redo' : 'undo' });
  }
  return (
    <div className="flex flex-col gap-6" onKeyDown={onKeyDown}>
      {handle.draft ? (
        <DraftNotice keptAt={handle.draft.keptAt} onTake={handle.takeDraft} onRefuse={handle.refuseDraft} />
      ) : null}
      <div className="grid gap-6 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
        <PhotoPart handle={handle} photo={photo} others={others} isSaved={plate !== null} still={still} />
        <div className="flex min-w-0 flex-col gap-6">
          <section aria-labelledby="spots-heading">
            <h2 id="spots-heading" className="text-lg">
              Spots
            </h2>
            <SpotTable
              marks={state.marks}
              measured={measured}
              still={still}
              caption={
                handle.touched || handle.proposal
                  ? 'Rf with standard uncertainty: a preview until the plate is saved.'
                  : 'Rf with standard uncertainty (k = 1).'
              }
              onShape={(lane, spot, shape) => dispatch({ type: 'changeSpot', lane, spot, shape })}
              onRemove={(ref) => dispatch({ type: 'remove', ref })}
            />
          </section>
          {still ? null : (
            <>
              <LaneList handle={handle} fractions={fractions} />
              <section aria-labelledby="plate-heading">
                <h2 id="plate-heading" className="mb-3 text-lg">
                  Plate
                </h2>
                <FactsFields facts={facts} onChange={handle.changeFacts} errorOf={saving.errorOf} />
              </section>
            </>
          )}
        </div>
      </div>
      {handle.isKept ? null : (
        <Notice kind="needs you" title="This device keeps no unsaved marks" live>
          Its storage is full or switched off: save before you close the page.
        </Notice>
      )}
      <SaveStates queue={saving.queue} photoId={photo.id} />
      <div>
        <Button
          variant="primary"
          busy={saving.queue.busy}
          disabledReason={stillReason ?? saving.missing}
          onClick={saving.save}
        >
          {plate ? 'Save the changed marks' : 'Save the plate'}
        </Button>
      </div>
      <UnsureSaveDialog
        count={saving.asked}
        whyNotWithout={saving.whyNotWithout}
        whyNotWith={saving.whyNotWith}
        onClose={saving.closeQuestion}
        onSave={saving.send}
      />
    </div>
  );
}
