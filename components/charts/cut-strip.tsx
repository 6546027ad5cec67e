'use client';
import { findState } from '@/components/states/marks';
import { StateMark } from '@/components/states/state-mark';
import { CutStripCurve } from './cut-strip-curve';
import { layoutCurve, layoutSegments, temperatureRange } from './cut-strip-layout';
import { BAND_HEIGHT, CutPatterns, CutStripSegmentView, ROW_HEIGHT } from './cut-strip-segment';
import { CutStripTable } from './cut-strip-table';
import { EVIDENCE_KINDS, EVIDENCE_NAMES, type CutStripProps } from './cut-strip-types';
import { useWidth } from './use-width';

const GUTTER = 58;
const CURVE_HEIGHT = 132;
const MIN_SEGMENT = 44;

/**
 * The run as a strip: one segment a receiver, as wide as what was collected in it, the head temperature above, the marks
 * of its evidence below. Reads without colour, by keyboard, on paper, and as a table.
 */
export function CutStrip({
  segments,
  headCurve = [],
  expectedBoilingPointC,
  current,
  title = 'Cuts of this run',
}: CutStripProps) {
  const { ref, width } = useWidth<HTMLDivElement>(720);
  const masses = segments.map((segment) => segment.netMassG);
  const boxes = layoutSegments(masses, width - GUTTER - 4, MIN_SEGMENT).map((box) => ({ ...box }));
  const stripWidth = boxes.reduce((sum, box) => sum + box.width, 0);
  const range = temperatureRange(segments, headCurve, expectedBoilingPointC);
  const top = range ? CURVE_HEIGHT + 12 : 14;
  const height = top + BAND_HEIGHT + 6 * ROW_HEIGHT + 14;
  const rowY = (row: number) => top + BAND_HEIGHT + (row > 3 ? 8 : 4) + row * ROW_HEIGHT;
  const rows = [...EVIDENCE_KINDS.map((kind) => EVIDENCE_NAMES[kind].short), 'Verdict', 'Status'];
  if (segments.length === 0)
    return <p className="text-ink-soft">No receiver yet. Start a fraction when the first drop falls.</p>;
  return (
    <figure className="print-whole">
      <div
        ref={ref}
        className="w-full overflow-x-auto overflow-y-hidden [contain:inline-size]"
        tabIndex={stripWidth + GUTTER > width ? 0 : undefined}
      >
        <svg
          width={stripWidth + GUTTER + 4}
          height={height}
          role="group"
          aria-label={title}
          className="block"
        >
          <CutPatterns />
          {range ? (
            <CutStripCurve
              x={GUTTER}
              width={stripWidth}
              height={CURVE_HEIGHT}
              range={range}
              curve={layoutCurve(headCurve, masses, boxes)}
              segments={segments}
              boxes={boxes}
              expectedC={expectedBoilingPointC}
            />
          ) : null}
          {rows.map((name, row) => (
            <g key={name} aria-hidden="true">
              <text x={GUTTER - 8} y={rowY(row) + 16} textAnchor="end" className="fill-ink-soft text-[12px]">
                {name}
              </text>
              <line
                x1={row === 0 ? GUTTER : 4}
                x2={GUTTER + stripWidth}
                y1={rowY(row) - (row === 4 ? 2 : 0)}
                y2={rowY(row) - (row === 4 ? 2 : 0)}
                className={row === 4 ? 'stroke-line-strong' : 'stroke-line'}
              />
            </g>
          ))}
          {segments.map((segment, at) => (
            <CutStripSegmentView
              key={segment.code}
              segment={segment}
              box={{ ...boxes[at]!, x: boxes[at]!.x + GUTTER }}
              top={top}
              current={segment.code === current}
            />
          ))}
        </svg>
      </div>
      <figcaption className="mt-2 flex flex-wrap items-center gap-x-4 gap-y-1 text-sm text-ink-soft">
        <span>{title}. Width: collected mass.</span>
        <Legend states={segments.flatMap((s) => [...Object.values(s.evidence), s.status, s.verdict ?? ''])} />
      </figcaption>
      <details className="mt-1 no-print">
        <summary className="flex min-h-target w-fit items-center text-sm text-glass underline underline-offset-4">
          As a table
        </summary>
        <CutStripTable segments={segments} title={title} />
      </details>
    </figure>
  );
}

/** The words of the marks that are in the picture, since a narrow segment has no room for them. */
function Legend({ states }: { states: readonly string[] }) {
  const words = [
    ...new Set(states.map((state) => findState(state)?.word).filter((word) => word !== undefined)),
  ];
  return words.map((word) => <StateMark key={word} state={word} look="plain" size="sm" />);
}
