'use client';
import { type PointerEvent, useRef, useState } from 'react';
import { previewPath } from '@/components/evidence/photo';
import { useWidth } from '@/components/charts/use-width';
import { nameOf } from './mark-names';
import { MarkHandle } from './mark-handle';
import { type MarkRef, type Point, sameRef } from './marks';
import type { MarkMode } from './mark-modes';
import { PlateLines } from './plate-lines';
import type { MarksHandle } from './use-marks';
import { usePhotoRoom } from './use-photo-room';

type PlateCanvasProps = {
  handle: MarksHandle;
  photo: { id: string; fileName: string; widthPx: number; heightPx: number };
  mode: MarkMode;
  zoom: number;
  /** Nothing can be moved: for people who may look only. */
  still: boolean;
};

function refsOf({ state: { marks } }: MarksHandle): { ref: MarkRef; at: Point; shape?: 'spot' | 'streak' }[] {
  return [
    ...marks.baseline.map((at, index) => ({ ref: { kind: 'baseline', index } as const, at })),
    ...marks.front.map((at, index) => ({ ref: { kind: 'front', index } as const, at })),
    ...marks.lanes.flatMap((lane, index) => [
      { ref: { kind: 'lane', lane: index } as const, at: { x: lane.x, y: 0 } },
      ...lane.spots.map((spot, at) => ({
        ref: { kind: 'spot', lane: index, spot: at } as const,
        at: { x: spot.x, y: spot.y },
        shape: spot.shape,
      })),
    ]),
  ];
}

/** The photo with its marks over it. A press on the photo sets what the mode says; marks can be moved in every mode. */
export function PlateCanvas({ handle, photo, mode, zoom, still }: PlateCanvasProps) {
  const { state, dispatch, measured } = handle;
  const { ref: frame, width } = useWidth<HTMLDivElement>(640);
  const svg = useRef<SVGSVGElement>(null);
  const [pressed, setPressed] = useState<Point | null>(null);
  const { widthPx, heightPx } = photo;
  const room = usePhotoRoom();
  const [failed, setFailed] = useState(false);
  // At 100 % the whole plate is in sight.
  const shown = Math.max(1, Math.min(width, (room * widthPx) / heightPx) * zoom);
  const unit = widthPx / shown;

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
    // A finger that went on was scrolling the enlarged photo.
    if (still || !was || Math.hypot(event.clientX - was.x, event.clientY - was.y) > 8) return;
    const at = toPhoto(event);
    if (mode === 'baseline' || mode === 'front') dispatch({ type: 'addPoint', line: mode, at });
    if (mode === 'lane') dispatch({ type: 'addLane', x: at.x });
    if (mode === 'spot') dispatch({ type: 'addSpot', at });
    if (mode === 'move') dispatch({ type: 'select', ref: null });
  }
  return (
    <div
      ref={frame}
      className="max-h-[76dvh] overflow-auto rounded border border-line-strong bg-paper-sunk"
      // The enlarged photo can be scrolled by keyboard too.
      tabIndex={zoom > 1 ? 0 : -1}
      role={zoom > 1 ? 'region' : undefined}
      aria-label={zoom > 1 ? 'Enlarged photo' : undefined}
    >
      <svg
        ref={svg}
        viewBox={`0 0 ${widthPx} ${heightPx}`}
        width={shown}
        height={(shown * heightPx) / widthPx}
        role="group"
        aria-label={`Plate photo ${photo.fileName} with marks`}
        className={`mx-auto block select-none ${still || mode === 'move' ? '' : 'cursor-crosshair'}`}
        onPointerDown={(event) => setPressed({ x: event.clientX, y: event.clientY })}
        onPointerUp={press}
        onPointerCancel={() => setPressed(null)}
      >
        {/* Under the photo, which covers it as soon as it is there. */}
        <text x={widthPx / 2} y={heightPx / 2} textAnchor="middle" fontSize={15 * unit} fill="currentColor">
          {failed ? 'The photo did not come. Reload the page.' : 'The photo is coming …'}
        </text>
        <image
          href={previewPath(photo.id, 2048)}
          width={widthPx}
          height={heightPx}
          preserveAspectRatio="none"
          onError={() => setFailed(true)}
        />
        <PlateLines marks={state.marks} width={widthPx} height={heightPx} unit={unit} />
        {refsOf(handle).map(({ ref, at, shape }) => (
          <MarkHandle
            key={JSON.stringify(ref)}
            at={ref.kind === 'lane' ? { x: at.x, y: heightPx - 14 * unit } : at}
            unit={unit}
            kind={ref.kind}
            shape={shape}
            name={nameOf(state.marks, ref, measured)}
            selected={sameRef(state.selected, ref)}
            still={still}
            toPhoto={toPhoto}
            onSelect={() => !sameRef(state.selected, ref) && dispatch({ type: 'select', ref })}
            onMoveTo={(to) => dispatch({ type: 'move', ref, to })}
            onMoveBy={(dx, dy) => dispatch({ type: 'move', ref, to: { x: at.x + dx, y: at.y + dy } })}
            onEndMove={() => dispatch({ type: 'endMove' })}
            onRemove={() => {
              dispatch({ type: 'remove', ref });
              frame.current?.focus();
            }}
          />
        ))}
      </svg>
    </div>
  );
}
