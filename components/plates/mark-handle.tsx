'use client';
import type { KeyboardEvent, PointerEvent } from 'react';
import type { MarkRef, Point } from './marks';

type MarkHandleProps = {
  at: Point;
  /** Photo pixels in one pixel of the screen: what is drawn keeps its size whatever the zoom. */
  unit: number;
  kind: MarkRef['kind'];
  shape?: 'spot' | 'streak';
  name: string;
  selected: boolean;
  still: boolean;
  onSelect: () => void;
  onMoveTo: (point: Point) => void;
  onMoveBy: (dx: number, dy: number) => void;
  onEndMove: () => void;
  onRemove: () => void;
  toPhoto: (event: PointerEvent) => Point;
};

const glyphs: Record<MarkRef['kind'], string> = {
  baseline: 'M-9 0H9M0-6V6',
  front: 'M-9 0H9M-5-5 0 0l5-5',
  lane: 'M-7-8H7L0 2Z',
  // Open in the middle, so that the spot itself stays in sight.
  spot: 'M-13 0a13 13 0 1 0 26 0a13 13 0 1 0-26 0M0-17V-9M0 9V17M-17 0H-9M9 0H17',
};
const streakGlyph = 'M-9-12a9 9 0 0 1 18 0V12a9 9 0 0 1-18 0ZM-13 0H-5M5 0H13';

const arrows: Record<string, [number, number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/**
 * One mark that can be taken hold of: 44 px to hit, a dark sign in a light halo so that it shows on any ground. Drag it,
 * or move it by the arrow keys (1 px, with Shift 10 px); Delete takes it away.
 */
export function MarkHandle(props: MarkHandleProps) {
  const { at, unit, kind, shape, name, selected, still } = props;
  function onKeyDown(event: KeyboardEvent) {
    const arrow = arrows[event.key];
    if (still || (!arrow && event.key !== 'Delete' && event.key !== 'Backspace')) return;
    event.preventDefault();
    event.stopPropagation();
    const step = event.shiftKey ? 10 : 1;
    if (arrow) props.onMoveBy(arrow[0] * step, arrow[1] * step);
    else props.onRemove();
  }
  const glyph = shape === 'streak' ? streakGlyph : glyphs[kind];
  return (
    <g
      transform={`translate(${at.x} ${at.y}) scale(${unit})`}
      role="button"
      tabIndex={0}
      aria-label={name}
      aria-pressed={selected}
      data-mark={selected ? 'selected' : undefined}
      className={`group outline-none ${still ? '' : 'cursor-grab active:cursor-grabbing'}`}
      style={{ touchAction: 'none' }}
      onFocus={props.onSelect}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        event.stopPropagation();
        props.onSelect();
        if (!still) event.currentTarget.setPointerCapture(event.pointerId);
      }}
      onPointerMove={(event) => {
        if (!still && event.currentTarget.hasPointerCapture(event.pointerId))
          props.onMoveTo(props.toPhoto(event));
      }}
      onPointerUp={props.onEndMove}
      onPointerCancel={props.onEndMove}
      onClick={(event) => event.stopPropagation()}
    >
      <circle r="22" fill="transparent" />
      <path
        d={glyph}
        fill="none"
        stroke="#fff"
        strokeWidth="4.5"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <path
        d={glyph}
        fill="none"
        stroke={selected ? '#0e6a68' : '#1c1a16'}
        strokeWidth={selected ? 2.5 : 1.75}
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <g className={selected ? '' : 'opacity-0 group-focus-visible:opacity-100'}>
        <circle r="20" fill="none" stroke="#fff" strokeWidth="4.5" />
        <circle
          r="20"
          fill="none"
          stroke="#0e6a68"
          strokeWidth="2.5"
          strokeDasharray={selected ? undefined : '4 3'}
        />
      </g>
    </g>
  );
}
