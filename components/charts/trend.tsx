'use client';
import Link from 'next/link';
import { findState } from '@/components/states/marks';
import { MarkStrokes } from '@/components/states/mark-glyph';
import { linearScale, roundTicks, tickDecimals } from './scale';
import { useWidth } from './use-width';

export type TrendPoint = {
  /** Under the axis: the run's or fraction's code, or a date. */
  label: string;
  value: number;
  /** Half width of the interval, in the unit of the value; drawn as a bar. */
  uncertainty?: number | null;
  /** A verdict of marks.ts; its mark stands for the point. */
  verdict?: string | null;
  href?: string;
};

type TrendProps = {
  points: readonly TrendPoint[];
  /** "Purity by GC" */
  title: string;
  /** "area %" */
  unit: string;
  /** Drawn as a line; points on the wrong side of it are told by their verdict, not by this. */
  limit?: { value: number; label: string } | null;
  decimals?: number;
};

const LEFT = 56;
const HEIGHT = 220;
const BOTTOM = 30;
/** Of one character of a label under the axis, 11 px high; rather too wide than too narrow. */
const CHARACTER_PX = 6.6;
const TONE_TEXT = {
  glass: 'text-glass',
  ink: 'text-ink',
  soft: 'text-ink-soft',
  needs: 'text-needs',
  fails: 'text-fails',
};

/** One value per run or fraction, in order, with its uncertainty and a limit. Inline SVG with a table behind it. */
export function Trend({ points, title, unit, limit, decimals = 2 }: TrendProps) {
  const { ref, width } = useWidth<HTMLDivElement>(640);
  if (points.length === 0)
    return <p className="text-ink-soft">Nothing measured yet, so there is nothing to draw.</p>;
  const values = points.flatMap((p) => [p.value - (p.uncertainty ?? 0), p.value + (p.uncertainty ?? 0)]);
  if (limit) values.push(limit.value);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const pad = (high - low) * 0.12 || Math.abs(high) * 0.01 || 1;
  const y = linearScale([low - pad, high + pad], [HEIGHT - BOTTOM, 20]);
  const x = linearScale([0, points.length - 1], [LEFT + 24, width - 24]);
  const ticks = roundTicks(low - pad, high + pad, 5);
  const labelWidth = Math.max(64, ...points.map((p) => p.label.length * CHARACTER_PX));
  const every = Math.max(1, Math.ceil((points.length * (labelWidth + 12)) / Math.max(1, width - LEFT)));
  const line = points
    .map((p, at) => `${at ? 'L' : 'M'}${x(at).toFixed(1)} ${y(p.value).toFixed(1)}`)
    .join('');
  return (
    <figure className="print-whole">
      <div ref={ref} className="w-full [contain:inline-size]">
        <svg
          width={width}
          height={HEIGHT}
          role="group"
          aria-label={`${title}, ${unit}`}
          className="block max-w-full"
        >
          <g aria-hidden="true">
            <text x={LEFT - 8} y={11} textAnchor="end" className="fill-ink-soft text-[11px]">
              {unit}
            </text>
            {ticks.map((tick) => (
              <g key={tick}>
                <line x1={LEFT} x2={width} y1={y(tick)} y2={y(tick)} className="stroke-line" />
                <text x={LEFT - 8} y={y(tick) + 4} textAnchor="end" className="fill-ink-soft text-[11px]">
                  {tick.toFixed(tickDecimals(ticks))}
                </text>
              </g>
            ))}
            <path d={line} fill="none" className="stroke-line-strong" strokeWidth={1.5} />
            {limit ? (
              <>
                <line
                  x1={LEFT}
                  x2={width}
                  y1={y(limit.value)}
                  y2={y(limit.value)}
                  className="stroke-ink"
                  strokeWidth={1.5}
                  strokeDasharray="7 4"
                />
                <line
                  x1={width - 26}
                  x2={width}
                  y1={8}
                  y2={8}
                  className="stroke-ink"
                  strokeWidth={1.5}
                  strokeDasharray="7 3"
                />
                <text x={width - 32} y={12} textAnchor="end" className="fill-ink text-[12px]">
                  {limit.label}
                </text>
              </>
            ) : null}
            {points.map((p, at) =>
              at % every === 0 ? (
                <text
                  key={at}
                  x={Math.min(x(at), width - (p.label.length * CHARACTER_PX) / 2)}
                  y={HEIGHT - 8}
                  textAnchor="middle"
                  className="fill-ink-soft text-[11px]"
                >
                  {p.label}
                </text>
              ) : null,
            )}
          </g>
          {points.map((p, at) => (
            <Point
              key={at}
              point={p}
              x={x(at)}
              y={y}
              text={`${p.label}: ${formatValue(p, unit, decimals)}`}
            />
          ))}
        </svg>
      </div>
      <details className="mt-1 no-print">
        <summary className="flex min-h-target w-fit items-center text-sm text-glass underline underline-offset-4">
          As a table
        </summary>
        <table className="text-sm">
          <caption className="sr-only">{title}</caption>
          <tbody>
            {points.map((p, at) => (
              <tr key={at}>
                <th scope="row" className="py-1 pr-6 text-left font-normal">
                  {p.href ? (
                    <Link href={p.href} className="link">
                      {p.label}
                    </Link>
                  ) : (
                    p.label
                  )}
                </th>
                <td className="py-1 pr-6 text-right">{formatValue(p, unit, decimals)}</td>
                <td className="py-1">{p.verdict ? findState(p.verdict)?.word : ''}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </details>
    </figure>
  );
}

/** "99.21 ± 0.08 area %" */
function formatValue(point: TrendPoint, unit: string, decimals: number): string {
  const spread = point.uncertainty ? ` ± ${point.uncertainty.toFixed(decimals)}` : '';
  return `${point.value.toFixed(decimals)}${spread} ${unit}`;
}

function Point({
  point,
  x,
  y,
  text,
}: {
  point: TrendPoint;
  x: number;
  y: (v: number) => number;
  text: string;
}) {
  const entry = point.verdict ? findState(point.verdict) : null;
  const label = entry ? `${text}, ${entry.word}` : text;
  const spread = point.uncertainty ?? 0;
  const body = (
    <g className={entry ? TONE_TEXT[entry.tone] : 'text-ink'}>
      <title>{label}</title>
      <rect
        x={x - 22}
        y={y(point.value) - 22}
        width={44}
        height={44}
        rx={3}
        fill="transparent"
        className="focus-edge stroke-transparent"
      />
      {spread > 0 ? (
        <path
          d={`M${x} ${y(point.value + spread)}V${y(point.value - spread)}M${x - 4} ${y(point.value + spread)}h8M${x - 4} ${y(point.value - spread)}h8`}
          className="stroke-current"
        />
      ) : null}
      {entry ? (
        <g transform={`translate(${x - 8} ${y(point.value) - 8})`}>
          <rect x="1" y="0" width="14" height="16" rx="7" className="fill-paper" />
          <MarkStrokes mark={entry.mark} ground="var(--paper)" />
        </g>
      ) : (
        <circle cx={x} cy={y(point.value)} r={4} className="fill-current" />
      )}
    </g>
  );
  return point.href ? (
    <Link href={point.href} prefetch={false} aria-label={label}>
      {body}
    </Link>
  ) : (
    <g role="img" aria-label={label}>
      {body}
    </g>
  );
}
