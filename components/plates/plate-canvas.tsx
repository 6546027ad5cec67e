'use client';
import { type KeyboardEvent, type PointerEvent, type RefObject, useState } from 'react';
import { useWidth } from '@/components/charts/use-width';
import { previewPath } from '@/components/evidence/photo';
import { GhostSpots } from './ghost-spots';
import type { Ghost } from './ghosts';
import { isPointMode, type MarkMode } from './mark-modes';
import type { Point } from './marks';
import { PlateHandles } from './plate-handles';
import { PlateLines } from './plate-lines';
import { footUnder, laneAt, placeFor } from './plate-view';
import type { MarksHandle } from './use-marks';
import { usePhotoRoom } from './use-photo-room';
import type { ZoomHandle } from './use-zoom';
import { stepZoom } from './zoom';

type PlateCanvasProps = {
  handle: MarksHandle;
  photo: { id: string; fileName: string; widthPx: number; heightPx: number };
  mode: MarkMode;
  view: ZoomHandle;
  frameRef: RefObject<HTMLDivElement | null>;
  svgRef: RefObject<SVGSVGElement | null>;
  ghosts: readonly Ghost[];
  /** Nothing can be moved: for people who may look only. */
  still: boolean;
};

/** The photo with its marks over it. A press on the photo sets what the mode says; marks can be moved in every mode. */
export function PlateCanvas(props: PlateCanvasProps) {
  const { handle, photo, mode, view, frameRef, svgRef: svg, ghosts, still } = props;
  const { state, dispatch, frame } = handle;
  const { marks, selected } = state;
  const { ref: room, width } = useWidth<HTMLDivElement>(640);
  const [pressed, setPressed] = useState<Point | null>(null);
  const { widthPx, heightPx } = photo;
  const extent = { width: widthPx, height: heightPx };
  const roomHeight = usePhotoRoom();
  const [failed, setFailed] = useState(false);
  // At 100 % the whole plate is in sight.
  const shown = Math.max(1, Math.min(width, (roomHeight * widthPx) / heightPx) * view.zoom);
  const unit = widthPx / shown;
  const href = previewPath(photo.id, 2048);

  function toPhoto(event: { clientX: number; clientY: number }): Point {
    const box = svg.current!.getBoundingClientRect();
    const round = (value: number) => Math.round(value * 10) / 10;
    return {
      x: round(((event.clientX - box.left) / box.width) * widthPx),
      y: round(((event.clientY - box.top) / box.height) * heightPx),
    };
  }
  function press(event: PointerEvent) {
    const was = pressed;
    setPressed(null);
    // A finger that went on was scrolling the enlarged photo; two fingers were zooming it.
    if (still || !was || view.isPinching.current) return;
    if (Math.hypot(event.clientX - was.x, event.clientY - was.y) > 8) return;
    const at = toPhoto(event);
    if (isPointMode(mode)) dispatch({ type: 'addPoint', line: mode, at });
    if (mode === 'lane') dispatch({ type: 'addLane', x: footUnder(marks, frame, at) });
    if (mode === 'spot') dispatch({ type: 'addSpot', at, lane: laneAt(marks, frame, at) });
    if (mode === 'move' && selected) {
      dispatch({ type: 'move', ref: selected, to: placeFor(marks, frame, selected, at) });
      dispatch({ type: 'select', ref: null });
    }
  }
  function onKeyDown(event: KeyboardEvent) {
    const keys: Record<string, number> = {
      '+': stepZoom(view.zoom, 1),
      '=': stepZoom(view.zoom, 1),
      '-': stepZoom(view.zoom, -1),
      '0': 1,
    };
    const zoom = keys[event.key];
    if (event.key === 'Escape') dispatch({ type: 'select', ref: null });
    if (zoom === undefined || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    view.setZoom(zoom);
  }
  return (
    <div
      ref={frameRef}
      className="max-h-[76dvh] overflow-auto rounded border border-line-strong bg-paper-sunk p-4"
      // The enlarged photo can be scrolled by keyboard too.
      tabIndex={view.zoom > 1 ? 0 : -1}
      role={view.zoom > 1 ? 'region' : undefined}
      aria-label={view.zoom > 1 ? 'Enlarged photo' : undefined}
      // One finger scrolls; two are for the zoom of the photo, not of the page.
      style={{ touchAction: 'pan-x pan-y' }}
      onKeyDown={onKeyDown}
    >
      <div ref={room}>
        <svg
          ref={svg}
          viewBox={`0 0 ${widthPx} ${heightPx}`}
          width={shown}
          height={(shown * heightPx) / widthPx}
          role="group"
          aria-label={`Plate photo ${photo.fileName} with marks`}
          className={`mx-auto block overflow-visible select-none ${still || mode === 'move' ? '' : 'cursor-crosshair'}`}
          onPointerDown={(event) => setPressed({ x: event.clientX, y: event.clientY })}
          onPointerUp={press}
          onPointerCancel={() => setPressed(null)}
        >
          {/* Under the photo, which covers it as soon as it is there. */}
          <text x={widthPx / 2} y={heightPx / 2} textAnchor="middle" fontSize={15 * unit} fill="currentColor">
            {failed ? 'The photo did not come. Reload the page.' : 'The photo is coming …'}
          </text>
          <image
            href={href}
            width={widthPx}
            height={heightPx}
            preserveAspectRatio="none"
            onError={() => setFailed(true)}
          />
          <PlateLines marks={marks} frame={frame} extent={extent} unit={unit} />
          <GhostSpots ghosts={ghosts} unit={unit} />
          <PlateHandles
            handle={handle}
            extent={extent}
            unit={unit}
            href={href}
            still={still}
            view={view}
            frameRef={frameRef}
            toPhoto={toPhoto}
          />
        </svg>
      </div>
    </div>
  );
}
