import type { DrawnMarks } from '@/lib/evidence/tlc/drawn-marks';

type Point = { x: number; y: number };
const path = (points: readonly Point[]) =>
  points.map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`).join(' ');

/** A dark line in a pale halo: it is seen on any ground, also in grey print. */
function Line({ points, dashed = false }: { points: readonly Point[]; dashed?: boolean }) {
  return (
    <>
      <polyline points={path(points)} fill="none" stroke="#fff" strokeWidth={9} strokeOpacity={0.85} />
      <polyline
        points={path(points)}
        fill="none"
        stroke="#111"
        strokeWidth={4}
        strokeDasharray={dashed ? '14 8' : undefined}
      />
    </>
  );
}

function Text({
  x,
  y,
  children,
  anchor = 'middle',
}: Point & { children: string; anchor?: 'start' | 'middle' }) {
  return (
    <text
      x={x}
      y={y}
      textAnchor={anchor}
      fontSize={42}
      fontWeight={700}
      fill="#111"
      stroke="#fff"
      strokeWidth={10}
      paintOrder="stroke"
    >
      {children}
    </text>
  );
}

/** Picture of a plate with its lines, lanes and spots; the table beside it says the same in numbers. */
export function PlateDrawing({
  href,
  marks,
  label,
}: {
  href: string;
  marks: DrawnMarks | null;
  label: string;
}) {
  if (!marks)
    // eslint-disable-next-line @next/next/no-img-element -- our own preview, of the right size already
    return <img src={href} alt={label} className="max-h-[28rem] w-auto" />;
  const { width, height, baseline, front, lanes, spots } = marks;
  return (
    <svg
      viewBox={`0 0 ${width} ${height.toFixed(1)}`}
      role="img"
      aria-label={label}
      className="block max-h-[34rem] w-full bg-paper-sunk"
    >
      <image href={href} width={width} height={height} preserveAspectRatio="none" />
      <Line points={front} dashed />
      <Line points={baseline} />
      {lanes.map((lane) => (
        <Text key={`${lane.label}-${lane.x}`} x={lane.x} y={Math.min(height - 10, lane.baseY + 56)}>
          {lane.label}
        </Text>
      ))}
      {spots.map((spot) => (
        <g key={spot.name}>
          <circle
            cx={spot.x}
            cy={spot.y}
            r={24}
            fill="none"
            stroke="#fff"
            strokeWidth={9}
            strokeOpacity={0.85}
          />
          <circle cx={spot.x} cy={spot.y} r={24} fill="none" stroke="#111" strokeWidth={4} />
          <Text x={spot.x + 34} y={spot.y + 14} anchor="start">
            {spot.name}
          </Text>
        </g>
      ))}
    </svg>
  );
}
