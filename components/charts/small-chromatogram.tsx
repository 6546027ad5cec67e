import {
  layoutSmallChromatogram,
  type MarkedPeak,
  PICTURE_HEIGHT,
  PICTURE_WIDTH,
  placePeakNumbers,
  type SmallTrace,
} from './small-chromatogram-layout';

/** A whole chromatogram as a small picture, its peaks numbered as in the table. Drawn on the server; needs no script. */
export function SmallChromatogram({ trace, peaks }: { trace: SmallTrace; peaks: readonly MarkedPeak[] }) {
  const layout = layoutSmallChromatogram(trace);
  const marks = placePeakNumbers(peaks, layout);
  const label = `Chromatogram from ${layout.startMin.toFixed(1)} to ${layout.endMin.toFixed(1)} min with ${peaks.length} integrated ${peaks.length === 1 ? 'peak' : 'peaks'}`;
  return (
    <figure className="print-whole">
      <div role="img" aria-label={label}>
        <div aria-hidden="true" className="relative mx-2 h-5 text-xs font-bold">
          {marks
            .filter((mark) => mark.written)
            .map((mark) => (
              <span
                key={mark.number}
                className="absolute bottom-0 -translate-x-1/2"
                style={{ left: `${mark.leftPercent}%` }}
              >
                {mark.number}
              </span>
            ))}
        </div>
        <svg
          viewBox={`0 0 ${PICTURE_WIDTH} ${PICTURE_HEIGHT}`}
          preserveAspectRatio="none"
          aria-hidden="true"
          className="block h-36 w-full border-b border-line-strong px-2"
        >
          {marks.map((mark) => (
            <line
              key={mark.number}
              x1={10 * mark.leftPercent}
              x2={10 * mark.leftPercent}
              y1="0"
              y2={PICTURE_HEIGHT}
              className="stroke-line"
              vectorEffect="non-scaling-stroke"
            />
          ))}
          {layout.enlargedPath ? (
            <path
              d={layout.enlargedPath}
              fill="none"
              className="stroke-ink-soft"
              strokeDasharray="3 2"
              vectorEffect="non-scaling-stroke"
            />
          ) : null}
          <path
            d={layout.signalPath}
            fill="none"
            className="stroke-ink"
            strokeWidth="1.5"
            vectorEffect="non-scaling-stroke"
          />
        </svg>
        <p aria-hidden="true" className="mx-2 flex justify-between text-xs text-ink-soft">
          <span>{layout.startMin.toFixed(1)}</span>
          <span>{layout.endMin.toFixed(1)} min</span>
        </p>
      </div>
      {layout.enlargement ? (
        <figcaption className="mx-2 text-xs text-ink-soft">
          Dashed: the same signal, {layout.enlargement} times enlarged
        </figcaption>
      ) : null}
    </figure>
  );
}
