import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

type Trace = FractionSheet['traces'][number];

const width = 320;
const height = 96;
const floorPercent = 0.01;

/** Height of a stick: logarithm of area per cent, so that 0.1 % still shows beside 99 %. */
function stickHeight(areaPercent: number): number {
  const decades = Math.log10(100 / floorPercent);
  return ((height - 24) * Math.log10(Math.max(areaPercent, floorPercent) / floorPercent)) / decades;
}

/** The integration as sticks: where each peak is, how large it is on a logarithmic scale. */
export function SheetPeakSticks({ trace }: { trace: Trace }) {
  const peaks = trace.integration?.peaks ?? [];
  if (peaks.length === 0) return null;
  const end = trace.durationMin || 1;
  const label = `${peaks.length} peaks; the largest is ${Math.max(...peaks.map((peak) => peak.areaPercent)).toFixed(2)} area %`;
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={label}
      className="h-24 w-full bg-paper-raised"
    >
      <line x1="0" x2={width} y1={height - 16} y2={height - 16} stroke="var(--line-strong)" />
      {peaks.map((peak) => {
        const x = 6 + ((width - 12) * peak.retentionTimeMin) / end;
        return (
          <line
            key={peak.number}
            x1={x}
            x2={x}
            y1={height - 16}
            y2={height - 16 - stickHeight(peak.areaPercent)}
            stroke="var(--glass)"
            strokeWidth="3"
          />
        );
      })}
      <text x="2" y={height - 3} fontSize="11" fill="var(--ink-soft)">
        0 min
      </text>
      <text x={width - 2} y={height - 3} fontSize="11" textAnchor="end" fill="var(--ink-soft)">
        {end.toFixed(1)} min, area % on a log scale
      </text>
    </svg>
  );
}
