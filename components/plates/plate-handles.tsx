'use client';
import { type RefObject, useState } from 'react';
import type { Extent } from './edit-marks';
import { Loupe, type Sight } from './loupe';
import { MarkHandle } from './mark-handle';
import { nameOf } from './mark-names';
import { everyRef, markAt, type MarkRef, type Point, sameRef } from './marks';
import { placeFor, placeOnLane } from './plate-view';
import type { MarksHandle } from './use-marks';
import type { ZoomHandle } from './use-zoom';

type PlateHandlesProps = {
  handle: MarksHandle;
  extent: Extent;
  unit: number;
  /** Address of the photo, for the loupe. */
  href: string;
  still: boolean;
  view: ZoomHandle;
  frameRef: RefObject<HTMLDivElement | null>;
  toPhoto: (event: { clientX: number; clientY: number }) => Point;
};

/** Every mark as a handle, in the order of Tab, and the loupe beside the one that is being dragged. */
export function PlateHandles(props: PlateHandlesProps) {
  const { handle, extent, unit, href, still, view, frameRef, toPhoto } = props;
  const { state, dispatch, measured, frame } = handle;
  const { marks, selected } = state;
  const [drag, setDrag] = useState<{ ref: MarkRef; sight: Sight } | null>(null);

  /** Where a mark is shown: a lane near its lower end. */
  function shownAt(ref: MarkRef, mark: Point): Point {
    if (ref.kind !== 'lane') return { x: mark.x, y: mark.y };
    return placeOnLane(marks, frame, mark.x, frame ? 0.97 : 1 - (14 * unit) / extent.height, extent);
  }
  /** The part of the photo in sight, in its own pixels. */
  function sightNow(): Sight {
    const box = frameRef.current!.getBoundingClientRect();
    const from = toPhoto({ clientX: box.left, clientY: Math.max(0, box.top) });
    const to = toPhoto({ clientX: box.right, clientY: box.bottom });
    return { left: from.x, top: from.y, right: to.x, bottom: to.y };
  }
  function moveTo(ref: MarkRef, to: Point) {
    if (view.isPinching.current) return;
    setDrag({ ref, sight: sightNow() });
    dispatch({ type: 'move', ref, to: placeFor(marks, frame, ref, to) });
  }
  const dragged = drag && markAt(marks, drag.ref);
  return (
    <>
      {everyRef(marks).map((ref) => {
        const mark = markAt(marks, ref)!;
        return (
          <MarkHandle
            key={JSON.stringify(ref)}
            at={shownAt(ref, mark)}
            unit={unit}
            kind={ref.kind}
            shape={ref.kind === 'spot' ? marks.lanes[ref.lane]!.spots[ref.spot]!.shape : undefined}
            proposed={mark.proposed}
            name={nameOf(marks, ref, measured)}
            selected={sameRef(selected, ref)}
            still={still}
            toPhoto={toPhoto}
            onSelect={() => !sameRef(selected, ref) && dispatch({ type: 'select', ref })}
            onMoveTo={(to) => moveTo(ref, to)}
            onMoveBy={(dx, dy) => dispatch({ type: 'move', ref, to: { x: mark.x + dx, y: mark.y + dy } })}
            onEndMove={() => {
              setDrag(null);
              dispatch({ type: 'endMove' });
            }}
            onAccept={() => dispatch({ type: 'accept', ref })}
            onRemove={() => {
              dispatch({ type: 'remove', ref });
              frameRef.current?.focus();
            }}
          />
        );
      })}
      {drag && dragged ? (
        <Loupe at={shownAt(drag.ref, dragged)} sight={drag.sight} href={href} extent={extent} unit={unit} />
      ) : null}
    </>
  );
}
