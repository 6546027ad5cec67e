'use client';
import { type KeyboardEvent, type PointerEvent, useRef } from 'react';
import { MarkGlyph } from './mark-glyph';
import type { MarkRef, Point } from './marks';

type MarkHandleProps = {
  at: Point;
  /** Photo pixels in one pixel of the screen: what is drawn keeps its size whatever the zoom. */
  unit: number;
  kind: MarkRef['kind'];
  shape?: 'spot' | 'streak';
  proposed?: number;
  name: string;
  selected: boolean;
  still: boolean;
  onSelect: () => void;
  onMoveTo: (point: Point) => void;
  onMoveBy: (dx: number, dy: number) => void;
  onEndMove: () => void;
  onAccept: () => void;
  onRemove: () => void;
  toPhoto: (event: { clientX: number; clientY: number }) => Point;
};

const arrows: Record<string, [number, number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/** A finger that only taps trembles this far, px of the screen. */
const tremble = 4;

/**
 * One mark that can be taken hold of, 44 px to hit. Drag it, or move it by the arrow keys (1 px, with Shift 10 px);
 * Delete takes it away, Enter accepts one that is proposed.
 */
export function MarkHandle(props: MarkHandleProps) {
  const { at, unit, kind, shape, proposed, name, selected, still } = props;
  /** Where it was taken hold of, and how far beside the mark, which does not jump under the finger. */
  const grip = useRef<{ x: number; y: number; dx: number; dy: number; isMoving: boolean } | null>(null);

  function onKeyDown(event: KeyboardEvent) {
    const arrow = arrows[event.key];
    const accepts = proposed !== undefined && (event.key === 'Enter' || event.key === ' ');
    if (still || (!arrow && !accepts && event.key !== 'Delete' && event.key !== 'Backspace')) return;
    event.preventDefault();
    event.stopPropagation();
    const step = event.shiftKey ? 10 : 1;
    if (arrow) props.onMoveBy(arrow[0] * step, arrow[1] * step);
    else if (accepts) props.onAccept();
    else props.onRemove();
  }
  function take(event: PointerEvent) {
    event.stopPropagation();
    props.onSelect();
    if (still) return;
    const place = props.toPhoto(event);
    const [dx, dy] = [at.x - place.x, at.y - place.y];
    grip.current = { x: event.clientX, y: event.clientY, dx, dy, isMoving: false };
    event.currentTarget.setPointerCapture(event.pointerId);
  }
  function drag(event: PointerEvent) {
    const held = grip.current;
    if (!held || !event.currentTarget.hasPointerCapture(event.pointerId)) return;
    held.isMoving ||= Math.hypot(event.clientX - held.x, event.clientY - held.y) > tremble;
    if (!held.isMoving) return;
    const place = props.toPhoto(event);
    props.onMoveTo({ x: place.x + held.dx, y: place.y + held.dy });
  }
  function leave(event: PointerEvent) {
    event.stopPropagation();
    grip.current = null;
    props.onEndMove();
  }
  return (
    <g
      transform={`translate(${at.x} ${at.y}) scale(${unit})`}
      role="button"
      tabIndex={0}
      aria-label={name}
      aria-pressed={selected}
      data-mark={selected ? 'selected' : undefined}
      className={`group outline-none ${still ? '' : 'cursor-grab active:cursor-grabbing'}`}
      // Browsers heed touch-action only on what is not inline.
      style={{ touchAction: 'none', display: 'block' }}
      onFocus={props.onSelect}
      onKeyDown={onKeyDown}
      onPointerDown={take}
      onPointerMove={drag}
      onPointerUp={leave}
      onPointerCancel={leave}
      onClick={(event) => event.stopPropagation()}
    >
      <circle r="22" fill="transparent" />
      <MarkGlyph kind={kind} shape={shape} selected={selected} isProposed={proposed !== undefined} />
    </g>
  );
}
