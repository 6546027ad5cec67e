import type { MarkRef } from './marks';

const glyphs: Record<MarkRef['kind'], string> = {
  // A cross of sighting lines: the corner itself stays in sight.
  corner: 'M-14 0H-4M4 0H14M0-14V-4M0 4V14M-8-8H8V8H-8Z',
  baseline: 'M-9 0H9M0-6V6',
  front: 'M-9 0H9M-5-5 0 0l5-5',
  lane: 'M-7-8H7L0 2Z',
  // Open in the middle, so that the spot itself stays in sight.
  spot: 'M-13 0a13 13 0 1 0 26 0a13 13 0 1 0-26 0M0-17V-9M0 9V17M-17 0H-9M9 0H17',
};
const streakGlyph = 'M-9-12a9 9 0 0 1 18 0V12a9 9 0 0 1-18 0ZM-13 0H-5M5 0H13';

type MarkGlyphProps = {
  kind: MarkRef['kind'];
  shape?: 'spot' | 'streak';
  selected: boolean;
  isProposed: boolean;
};

const round = { fill: 'none', strokeLinecap: 'round', strokeLinejoin: 'round' } as const;

/** The sign of a mark, dark in a light halo so that it shows on any ground; dashed if proposed. */
export function MarkGlyph({ kind, shape, selected, isProposed }: MarkGlyphProps) {
  const glyph = shape === 'streak' ? streakGlyph : glyphs[kind];
  return (
    <>
      <path d={glyph} stroke="#fff" strokeWidth="4.5" {...round} />
      <path
        d={glyph}
        stroke={selected ? '#0e6a68' : '#1c1a16'}
        strokeWidth={selected ? 2.5 : 1.75}
        strokeDasharray={isProposed ? '3 3' : undefined}
        {...round}
        strokeLinecap={isProposed ? 'butt' : 'round'}
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
    </>
  );
}
