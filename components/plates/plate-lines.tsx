import type { PlateFrame } from '@/lib/evidence/tlc/plate-frame';
import type { Extent } from './edit-marks';
import type { MarkPoint, Marks, Point } from './marks';
import { placeOnLane, throughEdges } from './plate-view';

type PlateLinesProps = {
  marks: Marks;
  frame: PlateFrame | null;
  extent: Extent;
  unit: number;
};

const ink = '#1c1a16';
const written = (points: readonly Point[]) => points.map(({ x, y }) => `${x},${y}`).join(' ');
const between = (a: Point, b: Point): Point => ({ x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 });
const isProposed = (points: readonly MarkPoint[]) => points.some((point) => point.proposed !== undefined);

/** A line in a light halo; one that is proposed is broken into short pieces and says so. */
function Line(props: { points: Point[]; dash?: string; proposed: boolean; word: string; unit: number }) {
  const { points, proposed, unit } = props;
  const dash = proposed ? `${3 * unit} ${4 * unit}` : props.dash;
  // In the middle of its middle piece.
  const at = Math.max(0, Math.ceil(points.length / 2) - 1);
  const middle = points.length > 1 ? between(points[at]!, points[at + 1]!) : null;
  return (
    <g fill="none">
      <polyline points={written(points)} stroke="#fff" strokeWidth={4 * unit} strokeOpacity="0.85" />
      <polyline points={written(points)} stroke={ink} strokeWidth={1.5 * unit} strokeDasharray={dash} />
      {proposed && middle ? (
        <Word at={{ x: middle.x, y: middle.y - 8 * unit }} unit={unit}>
          {`proposed ${props.word}`}
        </Word>
      ) : null}
    </g>
  );
}

function Word({ at, unit, children }: { at: Point; unit: number; children: string }) {
  return (
    <text
      x={at.x}
      y={at.y}
      textAnchor="middle"
      fontSize={13 * unit}
      fontWeight="700"
      fill={ink}
      stroke="#fff"
      strokeWidth={4 * unit}
      paintOrder="stroke"
    >
      {children}
    </text>
  );
}

/** The plate's outline, baseline, front and lanes, dark in a light halo. The front is dashed, the lanes are dotted. */
export function PlateLines({ marks, frame, extent, unit }: PlateLinesProps) {
  const { corners, baseline, front, lanes } = marks;
  return (
    <g aria-hidden="true" pointerEvents="none">
      {corners.length === 4 ? (
        <Line
          points={[corners[2]!, corners[3]!, corners[0]!, corners[1]!, corners[2]!]}
          dash={`${2 * unit} ${3 * unit}`}
          proposed={isProposed(corners)}
          word="edge"
          unit={unit}
        />
      ) : null}
      {lanes.map((lane, index) => {
        const [top, foot] = [0, 1].map((share) => placeOnLane(marks, frame, lane.x, share, extent));
        const ends = { x1: top!.x, y1: top!.y, x2: foot!.x, y2: foot!.y };
        const dash = lane.proposed === undefined ? `${unit} ${5 * unit}` : `${unit} ${9 * unit}`;
        return (
          <g key={index}>
            <line {...ends} stroke="#fff" strokeWidth={3 * unit} strokeOpacity="0.55" />
            <line {...ends} stroke={ink} strokeWidth={unit} strokeDasharray={dash} />
          </g>
        );
      })}
      {baseline.length > 0 ? (
        <Line
          points={throughEdges(baseline, frame, extent)}
          proposed={isProposed(baseline)}
          word="baseline"
          unit={unit}
        />
      ) : null}
      {front.length > 0 ? (
        <Line
          points={throughEdges(front, frame, extent)}
          dash={`${10 * unit} ${5 * unit}`}
          proposed={isProposed(front)}
          word="front"
          unit={unit}
        />
      ) : null}
      {lanes.map((lane, index) => {
        const foot = placeOnLane(marks, frame, lane.x, 1, extent);
        return (
          <Word key={index} at={{ x: foot.x, y: foot.y - 34 * unit }} unit={unit}>
            {lane.proposed === undefined ? lane.label : `${lane.label}?`}
          </Word>
        );
      })}
      {lanes.flatMap((lane) =>
        lane.spots.flatMap(({ x, y, proposed }) =>
          proposed === undefined ? (
            []
          ) : (
            <Word key={`${x} ${y}`} at={{ x: x + 30 * unit, y: y - 12 * unit }} unit={0.85 * unit}>
              {`${Math.round(100 * proposed)} %`}
            </Word>
          ),
        ),
      )}
    </g>
  );
}
