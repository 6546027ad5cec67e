import type { Marks, Point } from './marks';

type PlateLinesProps = { marks: Marks; width: number; height: number; unit: number };

/** A line through its points, its end pieces going on to the edges of the photo, as it is read at each lane. */
function throughEdges(points: readonly Point[], width: number): string {
  const sorted = [...points].sort((a, b) => a.x - b.x);
  const first = sorted[0]!;
  const last = sorted.at(-1)!;
  const slope = (a: Point, b: Point) => (b.x - a.x < 1e-9 ? 0 : (b.y - a.y) / (b.x - a.x));
  const left = first.y - first.x * slope(first, sorted[1] ?? first);
  const right = last.y + (width - last.x) * slope(sorted.at(-2) ?? last, last);
  return [`0,${left}`, ...sorted.map(({ x, y }) => `${x},${y}`), `${width},${right}`].join(' ');
}

/** Baseline, front and lanes, dark in a light halo. The front is dashed, the lanes are dotted. */
export function PlateLines({ marks, width, height, unit }: PlateLinesProps) {
  const line = (points: readonly Point[], dash: string | undefined) =>
    points.length === 0 ? null : (
      <g fill="none">
        <polyline
          points={throughEdges(points, width)}
          stroke="#fff"
          strokeWidth={4 * unit}
          strokeOpacity="0.85"
        />
        <polyline
          points={throughEdges(points, width)}
          stroke="#1c1a16"
          strokeWidth={1.5 * unit}
          strokeDasharray={dash}
        />
      </g>
    );
  return (
    <g aria-hidden="true" pointerEvents="none">
      {marks.lanes.map((lane, index) => (
        <g key={index}>
          <line
            x1={lane.x}
            x2={lane.x}
            y1={0}
            y2={height}
            stroke="#fff"
            strokeWidth={3 * unit}
            strokeOpacity="0.55"
          />
          <line
            x1={lane.x}
            x2={lane.x}
            y1={0}
            y2={height}
            stroke="#1c1a16"
            strokeWidth={unit}
            strokeDasharray={`${unit} ${5 * unit}`}
          />
        </g>
      ))}
      {line(marks.baseline, undefined)}
      {line(marks.front, `${10 * unit} ${5 * unit}`)}
      {marks.lanes.map((lane, index) => (
        <text
          key={index}
          x={lane.x}
          y={height - 34 * unit}
          textAnchor="middle"
          fontSize={14 * unit}
          fontWeight="700"
          fill="#1c1a16"
          stroke="#fff"
          strokeWidth={4 * unit}
          paintOrder="stroke"
        >
          {lane.label}
        </text>
      ))}
    </g>
  );
}
