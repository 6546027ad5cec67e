import type { MarkStroke } from './marks';

/** The strokes of one mark, for use inside any 16 x 16 coordinate system. Inherits `currentColor`. */
export function MarkStrokes({
  mark,
  ground = 'var(--paper-raised)',
}: {
  mark: readonly MarkStroke[];
  ground?: string;
}) {
  return (
    <>
      {mark.map((stroke) => (
        <path
          key={stroke.d}
          d={stroke.d}
          fill={stroke.filled ? 'currentColor' : 'none'}
          stroke={stroke.cut ? ground : 'currentColor'}
          strokeWidth={1.5}
          strokeLinecap="round"
          strokeLinejoin="round"
          strokeDasharray={stroke.dashed ? '2 2.4' : undefined}
        />
      ))}
    </>
  );
}

type MarkGlyphProps = {
  mark: readonly MarkStroke[];
  size?: number;
  x?: number;
  y?: number;
  ground?: string;
  className?: string;
};

/** A mark as a picture without a name of its own: the word stands beside it, or the caller names it. */
export function MarkGlyph({ mark, size = 16, x, y, ground, className }: MarkGlyphProps) {
  return (
    <svg x={x} y={y} width={size} height={size} viewBox="0 0 16 16" aria-hidden="true" className={className}>
      <MarkStrokes mark={mark} ground={ground} />
    </svg>
  );
}
