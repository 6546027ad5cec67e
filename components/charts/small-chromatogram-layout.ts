import { linearScale } from './scale';

export type SmallTrace = { timeMin: readonly number[]; signal: readonly number[] };
export type MarkedPeak = { number: number; retentionTimeMin: number; areaPercent: number };

/** The picture's own coordinates; it is stretched to whatever place it gets. */
export const PICTURE_WIDTH = 1000;
export const PICTURE_HEIGHT = 100;
const TOP = 4;
const BOTTOM = 96;

/** How many times a second line may be enlarged, the largest first. */
const ENLARGEMENTS = [100, 50, 20, 10, 5] as const;

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
}

/** Path through the points, in the picture's coordinates, one decimal each. */
function pathOf(trace: SmallTrace, x: (v: number) => number, y: (v: number) => number): string {
  return trace.timeMin
    .map((time, at) => `${at ? 'L' : 'M'}${x(time).toFixed(1)} ${y(trace.signal[at]!).toFixed(1)}`)
    .join('');
}

/**
 * Lays out a whole trace as a small picture. Besides the signal it gives a second line, enlarged and cut off at the
 * top, on which peaks of a few tenths of a per cent show: enlarged as far as its unrest (median step between points of
 * the thinned trace) stays below 5 % of the height, or null where not even five times would do.
 */
export function layoutSmallChromatogram(trace: SmallTrace) {
  const [low, high] = trace.signal.reduce(([a, b], v) => [Math.min(a, v), Math.max(b, v)], [
    Infinity,
    -Infinity,
  ] as [number, number]);
  const startMin = trace.timeMin[0] ?? 0;
  const endMin = trace.timeMin.at(-1) ?? startMin;
  const x = linearScale([startMin, endMin], [0, PICTURE_WIDTH]);
  const y = linearScale([low, high], [BOTTOM, TOP]);
  const unrest = median(trace.signal.slice(1).map((v, at) => Math.abs(v - trace.signal[at]!)));
  const enlargement = ENLARGEMENTS.find((times) => times * unrest <= 0.05 * (high - low)) ?? null;
  const ground = median(trace.signal);
  const enlarged = (value: number) =>
    Math.min(BOTTOM + 4, Math.max(0, y(ground + (value - ground) * (enlargement ?? 1))));
  return {
    startMin,
    endMin,
    enlargement: high > low ? enlargement : null,
    signalPath: pathOf(trace, x, y),
    enlargedPath: enlargement && high > low ? pathOf(trace, x, enlarged) : null,
  };
}

/** Half the width of a written number, in per cent of a picture of 300 px. */
const halfWidth = (number: number) => 1.6 * String(number).length;

/**
 * Where each peak is marked, in per cent of the width. The number is written only where it has room: the larger peak
 * keeps its number, one so near that the two would touch in 300 px is marked by its line alone.
 */
export function placePeakNumbers(
  peaks: readonly MarkedPeak[],
  { startMin, endMin }: { startMin: number; endMin: number },
) {
  const span = endMin - startMin || 1;
  const placed = peaks
    .map((peak) => ({ ...peak, leftPercent: (100 * (peak.retentionTimeMin - startMin)) / span }))
    .filter((peak) => peak.leftPercent >= 0 && peak.leftPercent <= 100)
    .sort((a, b) => b.areaPercent - a.areaPercent);
  const numbered: typeof placed = [];
  for (const peak of placed) {
    const touches = numbered.some(
      (other) =>
        Math.abs(other.leftPercent - peak.leftPercent) < halfWidth(other.number) + halfWidth(peak.number),
    );
    if (!touches) numbered.push(peak);
  }
  return placed
    .map(({ number, leftPercent }) => ({
      number,
      leftPercent,
      written: numbered.some((each) => each.number === number),
    }))
    .sort((a, b) => a.number - b.number);
}
