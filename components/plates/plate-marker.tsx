'use client';
import { useRouter } from 'next/navigation';
import { type KeyboardEvent, useMemo, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { sayDone } from '@/components/ui/toaster';
import { dropDraft } from './draft-store';
import { DraftNotice } from './draft-notice';
import { type Facts, requestOf, whatIsMissing } from './facts';
import { FactsFields } from './facts-fields';
import { LaneEditor, type RunFraction } from './lane-editor';
import { type MarkMode, nextMode } from './mark-modes';
import type { Marks } from './marks';
import { PlateCanvas } from './plate-canvas';
import { PlateToolbar } from './plate-toolbar';
import { SpotTable } from './spot-table';
import { useMarks } from './use-marks';
import { useSavePlate } from './use-save-plate';

export type PlateMarkerProps = {
  runCode: string;
  fractions: readonly RunFraction[];
  photo: { id: string; fileName: string; widthPx: number; heightPx: number };
  first: { marks: Marks; facts: Facts };
  /** The saved plate that is changed; null for a new one. */
  plate: { id: string; version: number } | null;
  /** Why the marks may only be looked at. */
  stillReason: string | null;
};

/** Marks a plate photo: lines, lanes and spots on the picture, what they are beside it, Rf as it goes, and saves it. */
export function PlateMarker({ runCode, fractions, photo, first, plate, stillReason }: PlateMarkerProps) {
  const router = useRouter();
  const extent = useMemo(() => ({ width: photo.widthPx, height: photo.heightPx }), [photo]);
  const handle = useMarks(photo.id, extent, first);
  const { state, dispatch, facts, measured } = handle;
  const [mode, setMode] = useState<MarkMode>(() => (plate || stillReason ? 'move' : nextMode(first.marks)));
  const [zoom, setZoom] = useState(1);
  const { save, busy, problem, errorOf } = useSavePlate({ runCode, plate });
  const still = stillReason !== null;
  const missing = whatIsMissing(facts, state.marks) ?? measured?.problems[0]?.message ?? null;

  async function saveNow() {
    const saved = await save(requestOf(photo.id, facts, state.marks));
    if (!saved) return;
    dropDraft(photo.id);
    sayDone('The plate is saved.');
    router.push(`/plates/${saved.id}?photo=${photo.id}&saved=${saved.version}`);
    router.refresh();
  }
  function onKeyDown(event: KeyboardEvent) {
    if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'z') return;
    if (event.target instanceof HTMLInputElement || event.target instanceof HTMLTextAreaElement) return;
    event.preventDefault();
    dispatch({ type: event.shiftKey ? 'redo' : 'undo' });
  }
  return (
    <div className="flex flex-col gap-6" onKeyDown={onKeyDown}>
      {handle.draft ? (
        <DraftNotice
          keptAt={handle.draft.keptAt}
          onTake={() => {
            handle.takeDraft();
            setMode('move');
          }}
          onRefuse={handle.refuseDraft}
        />
      ) : null}
      <div className="grid gap-6 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
        <section aria-label="Photo" className="min-w-0">
          {still ? null : (
            <PlateToolbar
              handle={handle}
              mode={mode}
              onMode={setMode}
              zoom={zoom}
              onZoom={setZoom}
              size={extent}
            />
          )}
          <PlateCanvas handle={handle} photo={photo} mode={mode} zoom={zoom} still={still} />
          <p className="mt-2 text-sm text-ink-soft">
            Marks are taken as they lie in the photo: hold the phone straight above the plate. Perspective is
            not corrected.
          </p>
        </section>
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
                handle.touched
                  ? 'Rf with standard uncertainty: a preview until the plate is saved.'
                  : 'Rf with standard uncertainty (k = 1).'
              }
              onShape={(lane, spot, shape) => dispatch({ type: 'changeSpot', lane, spot, shape })}
              onRemove={(ref) => dispatch({ type: 'remove', ref })}
            />
          </section>
          {still ? null : (
            <>
              <section aria-labelledby="lanes-heading">
                <h2 id="lanes-heading" className="text-lg">
                  Lanes
                </h2>
                {state.marks.lanes.length === 0 ? (
                  <p className="text-ink-soft">
                    No lane yet: choose “Lane” above the photo and press on each.
                  </p>
                ) : (
                  <ol className="flex flex-col gap-3">
                    {state.marks.lanes.map((lane, index) => (
                      <LaneEditor
                        key={index}
                        lane={lane}
                        number={index + 1}
                        fractions={fractions}
                        selected={
                          (state.selected?.kind === 'lane' || state.selected?.kind === 'spot') &&
                          state.selected.lane === index
                        }
                        onChange={(change) => dispatch({ type: 'changeLane', lane: index, change })}
                        onRemove={() => dispatch({ type: 'remove', ref: { kind: 'lane', lane: index } })}
                      />
                    ))}
                  </ol>
                )}
              </section>
              <section aria-labelledby="plate-heading">
                <h2 id="plate-heading" className="mb-3 text-lg">
                  Plate
                </h2>
                <FactsFields facts={facts} onChange={handle.changeFacts} errorOf={errorOf} />
              </section>
            </>
          )}
        </div>
      </div>
      {problem ? (
        <Notice kind="fails" title="Not saved" live>
          {problem.detail} Your marks are still here and kept on this device.
        </Notice>
      ) : null}
      <div>
        <Button variant="primary" busy={busy} disabledReason={stillReason ?? missing} onClick={saveNow}>
          {plate ? 'Save the changed marks' : 'Save the plate'}
        </Button>
      </div>
    </div>
  );
}
