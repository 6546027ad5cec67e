import { linearScale, roundTicks, tickDecimals } from './scale';
import type { StripBox, StripSegmentInput } from './cut-strip-layout';

type CurveProps = {
  x: number;
  width: number;
  height: number;
  range: [number, number];
  curve: readonly { x: number; headTemperatureC: number }[];
  segments: readonly StripSegmentInput[];
  boxes: readonly StripBox[];
  expectedC?: number | null;
};

/** Head temperature over what was collected: the logged curve, or, where nothing was logged, a line per receiver. */
export function CutStripCurve({ x, width, height, range, curve, segments, boxes, expectedC }: CurveProps) {
  const y = linearScale(range, [height - 6, 16]);
  const ticks = roundTicks(range[0], range[1], 4);
  const decimals = tickDecimals(ticks);
  const line = curve
    .map((p, at) => `${at ? 'L' : 'M'}${p.x.toFixed(1)} ${y(p.headTemperatureC).toFixed(1)}`)
    .join('');
  return (
    <g aria-hidden="true">
      <text x={x - 8} y={9} textAnchor="end" className="fill-ink-soft text-[11px]">
        head °C
      </text>
      {ticks.map((tick) => (
        <g key={tick}>
          <line x1={x} x2={x + width} y1={y(tick)} y2={y(tick)} className="stroke-line" />
          <text x={x - 8} y={y(tick) + 4} textAnchor="end" className="fill-ink-soft text-[11px]">
            {tick.toFixed(decimals)}
          </text>
        </g>
      ))}
      {boxes.slice(1).map((box) => (
        <line
          key={box.x}
          x1={x + box.x}
          x2={x + box.x}
          y1={12}
          y2={height}
          className="stroke-line-strong"
          strokeDasharray="1 4"
        />
      ))}
      {expectedC != null ? (
        <g>
          <line
            x1={x}
            x2={x + width}
            y1={y(expectedC)}
            y2={y(expectedC)}
            className="stroke-ink-soft"
            strokeDasharray="7 4"
          />
          <line x1={x} x2={x + 26} y1={5} y2={5} className="stroke-ink-soft" strokeDasharray="7 3" />
          <text x={x + 32} y={9} className="fill-ink-soft text-[12px]">
            expected {expectedC.toFixed(1)} °C
          </text>
        </g>
      ) : null}
      <g transform={`translate(${x} 0)`}>
        {line ? (
          <path
            d={line}
            fill="none"
            className="stroke-ink"
            strokeWidth={2}
            strokeLinejoin="round"
            strokeLinecap="round"
          />
        ) : (
          segments.map((segment, at) => {
            const { headTemperatureFromC: from, headTemperatureToC: to } = segment;
            const box = boxes[at];
            if (!box || (from === null && to === null)) return null;
            return (
              <line
                key={box.x}
                x1={box.x + 3}
                x2={box.x + box.width - 3}
                y1={y((from ?? to)!)}
                y2={y((to ?? from)!)}
                className="stroke-ink"
                strokeWidth={2}
                strokeLinecap="round"
              />
            );
          })
        )}
      </g>
    </g>
  );
}
