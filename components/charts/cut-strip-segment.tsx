import Link from 'next/link';
import { findState } from '@/components/states/marks';
import { MarkStrokes } from '@/components/states/mark-glyph';
import type { StripBox } from './cut-strip-layout';
import { describeSegment } from './cut-strip-table';
import { EVIDENCE_KINDS, type CutStripSegment } from './cut-strip-types';

export const BAND_HEIGHT = 56;
export const ROW_HEIGHT = 24;
/** From this width on a mark has its word beside it. */
const WORD_WIDTH = 104;

const TONE_TEXT = {
  glass: 'text-glass',
  ink: 'text-ink',
  soft: 'text-ink-soft',
  needs: 'text-needs',
  fails: 'text-fails',
};

/** The ground of a cut: the heart is filled with the accent, each other cut has a hatching of its own. */
const FILL: Record<string, string> = {
  'fore-run': 'url(#cut-fore-run)',
  heart: 'var(--glass)',
  tail: 'url(#cut-tail)',
  residue: 'url(#cut-residue)',
  trap: 'url(#cut-trap)',
};

/** The hatchings, once in each strip. */
export function CutPatterns() {
  const line = { className: 'stroke-line-strong', strokeWidth: 1.2 };
  return (
    <defs>
      <pattern
        id="cut-fore-run"
        width="8"
        height="8"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(45)"
      >
        <rect width="8" height="8" className="fill-paper-sunk" />
        <line x1="0" y1="0" x2="0" y2="8" {...line} />
      </pattern>
      <pattern
        id="cut-tail"
        width="8"
        height="8"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(-45)"
      >
        <rect width="8" height="8" className="fill-paper-sunk" />
        <line x1="0" y1="0" x2="0" y2="8" strokeDasharray="4 4" {...line} />
      </pattern>
      <pattern id="cut-residue" width="8" height="8" patternUnits="userSpaceOnUse">
        <rect width="8" height="8" className="fill-paper-sunk" />
        <path d="M0 4h8M4 0v8" {...line} />
      </pattern>
      <pattern id="cut-trap" width="8" height="8" patternUnits="userSpaceOnUse">
        <rect width="8" height="8" className="fill-paper-sunk" />
        <circle cx="4" cy="4" r="1.1" className="fill-line-strong" />
      </pattern>
    </defs>
  );
}

function Mark({ state, box, y }: { state: string | null; box: StripBox; y: number }) {
  const entry = state ? findState(state) : null;
  const middle = box.x + box.width / 2;
  if (!entry) return null;
  const wordy = box.width >= WORD_WIDTH;
  return (
    <g className={TONE_TEXT[entry.tone]}>
      <g transform={`translate(${wordy ? box.x + 10 : middle - 8} ${y + 4})`}>
        <MarkStrokes mark={entry.mark} />
      </g>
      {wordy ? (
        <text x={box.x + 31} y={y + 16} className="fill-current text-[12px] font-bold">
          {entry.word}
        </text>
      ) : null}
    </g>
  );
}

type SegmentProps = { segment: CutStripSegment; box: StripBox; top: number; current: boolean };

/** One receiver: its band with number, cut and mass, and its marks under it. The whole column is one link. */
export function CutStripSegmentView({ segment, box, top, current }: SegmentProps) {
  const cut = findState(segment.cut)?.word ?? segment.cut;
  const filled = cut === 'heart';
  const ink = filled ? 'fill-glass-on' : 'fill-ink';
  const halo = filled ? {} : { stroke: 'var(--paper-sunk)', strokeWidth: 5, paintOrder: 'stroke' };
  const wide = box.width >= 84;
  const below = top + BAND_HEIGHT;
  const height = BAND_HEIGHT + ROW_HEIGHT * 6;
  const middle = box.x + box.width / 2;
  const body = (
    <>
      <rect x={box.x} y={top} width={box.width} height={height} fill="transparent" />
      <rect
        x={box.x + 1}
        y={top}
        width={box.width - 2}
        height={BAND_HEIGHT}
        fill={FILL[cut] ?? 'var(--paper-sunk)'}
        className="stroke-ink"
      />
      <text
        x={middle}
        y={top + (wide ? 20 : 24)}
        textAnchor="middle"
        className={`${ink} text-[15px] font-bold`}
        {...halo}
      >
        {segment.number}
        {wide ? ` ${cut}` : ''}
      </text>
      <text x={middle} y={top + 42} textAnchor="middle" className={`${ink} text-[12px]`} {...halo}>
        {segment.netMassG === null
          ? '–'
          : `${segment.netMassG.toFixed(wide ? 2 : 1)}${box.width >= 60 ? ' g' : ''}`}
      </text>
      {EVIDENCE_KINDS.map((kind, row) => (
        <Mark key={kind} state={segment.evidence[kind]} box={box} y={below + 4 + row * ROW_HEIGHT} />
      ))}
      <Mark state={segment.verdict} box={box} y={below + 8 + 4 * ROW_HEIGHT} />
      <Mark state={segment.status} box={box} y={below + 8 + 5 * ROW_HEIGHT} />
      <rect
        x={box.x + 1.5}
        y={top - 2}
        width={box.width - 3}
        height={height + 12}
        rx={3}
        fill="none"
        className={`focus-edge ${current ? 'stroke-ink' : 'stroke-transparent'}`}
        strokeWidth={2.5}
      />
      {current ? <path d={`M${middle - 7} ${top - 10}h14l-7 8Z`} className="fill-ink" /> : null}
    </>
  );
  if (!segment.href)
    return (
      <g role="img" aria-label={describeSegment(segment)}>
        <title>{describeSegment(segment)}</title>
        {body}
      </g>
    );
  return (
    <Link
      href={segment.href}
      prefetch={false}
      aria-current={current ? 'page' : undefined}
      className="group hover:[&_.focus-edge]:stroke-glass"
    >
      {/* The title names the link in sentences; the words in the drawing would only repeat it in pieces. */}
      <title>{describeSegment(segment)}</title>
      <g aria-hidden="true">{body}</g>
    </Link>
  );
}
