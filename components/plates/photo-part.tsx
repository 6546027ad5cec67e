'use client';
import { useRef, useState } from 'react';
import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';
import { GhostList } from './ghost-list';
import { ghostsOf } from './ghosts';
import { type MarkMode, nextMode } from './mark-modes';
import { PlateCanvas } from './plate-canvas';
import { PlateToolbar } from './plate-toolbar';
import { ProposedList } from './proposed-list';
import { SelectedBar } from './selected-bar';
import { SuggestionPanel } from './suggestion-panel';
import type { MarksHandle } from './use-marks';
import { useSuggestion } from './use-suggestion';
import { useZoom } from './use-zoom';

type PhotoPartProps = {
  handle: MarksHandle;
  photo: { id: string; fileName: string; widthPx: number; heightPx: number };
  /** The other photos of the plate, as they are saved. */
  others: readonly PlatePhotoView[];
  isSaved: boolean;
  still: boolean;
};

/** The photo with everything that is done on it. */
export function PhotoPart({ handle, photo, others, isSaved, still }: PhotoPartProps) {
  const { marks } = handle.state;
  const frameRef = useRef<HTMLDivElement>(null);
  const svgRef = useRef<SVGSVGElement>(null);
  const view = useZoom(frameRef, svgRef);
  const [mode, setMode] = useState<MarkMode>(() => (isSaved || still ? 'move' : nextMode(marks)));
  const suggestion = useSuggestion(photo.id, (proposal) => {
    handle.propose(proposal);
    setMode('move');
  });
  const ghosts = ghostsOf(others, photo.id, handle.frame);
  return (
    <section aria-label="Photo" className="min-w-0">
      {still ? null : (
        <>
          <SuggestionPanel handle={handle} suggestion={suggestion} isFresh={!isSaved && !handle.touched} />
          <PlateToolbar
            handle={handle}
            mode={mode}
            onMode={setMode}
            view={view}
            size={{ width: photo.widthPx, height: photo.heightPx }}
          />
        </>
      )}
      <PlateCanvas
        handle={handle}
        photo={photo}
        mode={mode}
        view={view}
        frameRef={frameRef}
        svgRef={svgRef}
        ghosts={ghosts}
        still={still}
      />
      {still ? null : <SelectedBar handle={handle} />}
      {still ? null : <ProposedList handle={handle} />}
      <GhostList handle={handle} ghosts={ghosts} others={others} still={still} />
      <p className="mt-2 text-sm text-ink-soft">
        {handle.frame
          ? `Measured on the plate by its four corners, in ${handle.frame.unit === 'mm' ? 'millimetres' : 'shares of its sides: enter its size for millimetres'}.`
          : 'Marks are taken as they lie in the photo. With the four corners of the plate, its tilt is taken out.'}
      </p>
    </section>
  );
}
