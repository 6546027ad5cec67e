'use client';
import { Button } from '@/components/ui/button';
import { adviceFor, isPointMode, type MarkMode, markModes, modeWords } from './mark-modes';
import { startPlace } from './start-place';
import type { MarksHandle } from './use-marks';
import type { ZoomHandle } from './use-zoom';
import { stepZoom } from './zoom';

type PlateToolbarProps = {
  handle: MarksHandle;
  mode: MarkMode;
  onMode: (mode: MarkMode) => void;
  view: ZoomHandle;
  size: { width: number; height: number };
};

/** Undo and redo; zoom, which pinching does too. */
function StepButtons({ handle: { state, dispatch }, view }: Pick<PlateToolbarProps, 'handle' | 'view'>) {
  const { zoom, setZoom } = view;
  return (
    <div className="flex flex-wrap gap-1">
      {(['undo', 'redo'] as const).map((type) => {
        const isEmpty = (type === 'undo' ? state.past : state.future).length === 0;
        return (
          <Button
            key={type}
            onClick={() => dispatch({ type })}
            aria-disabled={isEmpty}
            className={isEmpty ? 'opacity-60' : ''}
          >
            {type === 'undo' ? 'Undo' : 'Redo'}
          </Button>
        );
      })}
      <Button onClick={() => setZoom(stepZoom(zoom, -1))} aria-label="Zoom out">
        −
      </Button>
      <Button onClick={() => setZoom(stepZoom(zoom, 1))} aria-label="Zoom in">
        +
      </Button>
      <span role="status" className="self-center px-1 text-sm text-ink-soft">
        {Math.round(zoom * 100)} %
      </span>
    </div>
  );
}

/** What a press sets, undo and redo, zoom; and a way to set a mark by keyboard alone. */
export function PlateToolbar({ handle, mode, onMode, view, size }: PlateToolbarProps) {
  const { state, dispatch } = handle;
  function addHere() {
    const { selected } = state;
    const at = startPlace(state.marks, selected, mode, size);
    const lane = selected?.kind === 'lane' || selected?.kind === 'spot' ? selected.lane : undefined;
    if (isPointMode(mode)) dispatch({ type: 'addPoint', line: mode, at });
    if (mode === 'lane') dispatch({ type: 'addLane', x: at.x });
    if (mode === 'spot') dispatch({ type: 'addSpot', at, lane });
    // The keys go to the new mark at once, so that the arrows move it.
    requestAnimationFrame(() => document.querySelector<SVGGElement>('[data-mark="selected"]')?.focus());
  }
  return (
    <div className="flex flex-col gap-2 py-2">
      <div className="flex flex-wrap gap-x-3 gap-y-2">
        <div role="group" aria-label="What a press on the photo sets" className="flex flex-wrap">
          {markModes.map((one) => (
            <button
              key={one}
              type="button"
              aria-pressed={mode === one}
              onClick={() => onMode(one)}
              className={`-ml-px min-h-target min-w-target border border-line-strong px-3 font-bold first:ml-0 first:rounded-l last:rounded-r ${
                mode === one ? 'bg-glass text-glass-on' : 'bg-paper-raised text-ink hover:bg-paper-sunk'
              }`}
            >
              {modeWords[one]}
            </button>
          ))}
        </div>
        <StepButtons handle={handle} view={view} />
      </div>
      <div className="flex min-h-target flex-wrap items-center gap-x-3 gap-y-1">
        <p role="status" className="min-w-0 flex-1 basis-56 text-sm">
          {adviceFor(mode, state.marks)}
        </p>
        {mode === 'move' ? null : (
          <Button variant="quiet" onClick={addHere}>
            Set without pointing
          </Button>
        )}
      </div>
    </div>
  );
}
