'use client';
import { Button } from '@/components/ui/button';
import type { Point } from './marks';
import { adviceFor, type MarkMode, markModes, modeWords } from './mark-modes';
import type { MarksHandle } from './use-marks';

type PlateToolbarProps = {
  handle: MarksHandle;
  mode: MarkMode;
  onMode: (mode: MarkMode) => void;
  zoom: number;
  onZoom: (zoom: number) => void;
  size: { width: number; height: number };
};

const zooms = [1, 1.5, 2, 3, 4, 6];

function stepZoom(zoom: number, by: 1 | -1): number {
  return zooms[Math.min(zooms.length - 1, Math.max(0, zooms.indexOf(zoom) + by))] ?? 1;
}

/** Where a mark starts that is set without pointing: near where such marks usually are, beside those that are there. */
function startPlace(
  handle: MarksHandle,
  mode: MarkMode,
  { width, height }: PlateToolbarProps['size'],
): Point {
  const { marks, selected } = handle.state;
  if (mode === 'baseline' || mode === 'front') {
    const share = [0.1, 0.9, 0.5, 0.3, 0.7][marks[mode].length] ?? 0.5;
    return { x: Math.round(width * share), y: Math.round(height * (mode === 'baseline' ? 0.88 : 0.1)) };
  }
  const lane =
    selected?.kind === 'lane' || selected?.kind === 'spot' ? marks.lanes[selected.lane] : marks.lanes.at(-1);
  if (mode === 'spot' && lane) return { x: lane.x, y: Math.round(height / 2) };
  return { x: Math.round((width * (marks.lanes.length + 1)) / (marks.lanes.length + 2)), y: height / 2 };
}

/** What a press sets, undo and redo, zoom; and a way to set a mark by keyboard alone. */
export function PlateToolbar({ handle, mode, onMode, zoom, onZoom, size }: PlateToolbarProps) {
  const { state, dispatch } = handle;
  function addHere() {
    const at = startPlace(handle, mode, size);
    const { selected } = state;
    const lane = selected?.kind === 'lane' || selected?.kind === 'spot' ? selected.lane : undefined;
    if (mode === 'baseline' || mode === 'front') dispatch({ type: 'addPoint', line: mode, at });
    if (mode === 'lane') dispatch({ type: 'addLane', x: at.x });
    if (mode === 'spot') dispatch({ type: 'addSpot', at, lane });
    // The keys go to the new mark at once, so that the arrows move it.
    requestAnimationFrame(() => document.querySelector<SVGGElement>('[data-mark="selected"]')?.focus());
  }
  const advice = adviceFor(mode, state.marks);
  return (
    <div className="z-10 flex flex-col gap-2 bg-paper py-2 sm:sticky sm:top-0">
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
        <div className="flex flex-wrap gap-1">
          <Button
            onClick={() => dispatch({ type: 'undo' })}
            aria-disabled={state.past.length === 0}
            className={state.past.length === 0 ? 'opacity-60' : ''}
          >
            Undo
          </Button>
          <Button
            onClick={() => dispatch({ type: 'redo' })}
            aria-disabled={state.future.length === 0}
            className={state.future.length === 0 ? 'opacity-60' : ''}
          >
            Redo
          </Button>
          <Button onClick={() => onZoom(stepZoom(zoom, -1))} aria-label="Zoom out">
            −
          </Button>
          <Button onClick={() => onZoom(stepZoom(zoom, 1))} aria-label="Zoom in">
            +
          </Button>
          <span role="status" className="self-center px-1 text-sm text-ink-soft">
            {Math.round(zoom * 100)} %
          </span>
        </div>
      </div>
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
        <p role="status" className="min-w-0 flex-1 basis-56 text-sm">
          {advice}
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
