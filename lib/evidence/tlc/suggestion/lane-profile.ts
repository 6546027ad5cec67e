import { alongAt, type Point } from '../polyline';
import { robustSpread, takeMedian, type Raster } from './raster';

export type LaneProfile = {
  /** Distance from the baseline as a share of the developed distance, evenly from `from` to `to`. */
  rf: Float32Array;
  /** Mean signal across the lane less its background, in the signal's own units. */
  signal: Float32Array;
  /** Standard deviation of the signal where there is no spot. */
  noise: number;
};

export type ProfileArea = { rf: number; fromRf: number; toRf: number; area: number; shareOfLane: number };

/** Half the width of the strip that is averaged where lanes leave room, as a share of the distance between them. */
export const STRIP_OF_PITCH = 0.4;

/**
 * The signal along a lane, averaged over a strip of `halfWidth` pixels to each side, from a little behind the
 * baseline to a little beyond the front, both taken where the lane lies. The background is the running median
 * of the lower half of the signal over a third of the lane, drawn straight between.
 */
export function profileLane(
  signal: Raster,
  x: number,
  halfWidth: number,
  lines: { baseline: readonly Point[]; front: readonly Point[] },
  samples = 320,
): LaneProfile | null {
  const turn = (line: readonly Point[]) => line.map((p) => ({ across: p.x, along: p.y }));
  const base = alongAt(turn(lines.baseline), x);
  const top = alongAt(turn(lines.front), x);
  if (base === null || top === null || base - top < 10) return null;
  const rf = new Float32Array(samples);
  const raw = new Float32Array(samples);
  const left = Math.max(0, Math.round(x - halfWidth));
  const right = Math.min(signal.width - 1, Math.round(x + halfWidth));
  for (let i = 0; i < samples; i += 1) {
    rf[i] = -0.03 + (1.06 * i) / (samples - 1);
    const y = base - rf[i]! * (base - top) - 0.5;
    const row = Math.max(0, Math.min(signal.height - 2, Math.floor(y)));
    const down = Math.max(0, Math.min(1, y - row));
    let sum = 0;
    for (let u = left; u <= right; u += 1) {
      const at = row * signal.width + u;
      sum += signal.data[at]! + down * (signal.data[at + signal.width]! - signal.data[at]!);
    }
    raw[i] = sum / (right - left + 1);
  }
  const background = lowerCourse(raw, Math.round(samples / 6));
  const flat = raw.map((v, i) => v - background[i]!);
  return {
    rf,
    signal: flat,
    noise: robustSpread(flat.filter((v, i) => raw[i]! <= background[i]! || v < 0)).spread,
  };
}

/** Median of the lower half of what lies within `reach` samples: it runs under the spots, not over them. */
function lowerCourse(values: Float32Array, reach: number): Float32Array {
  const steps = 24;
  const knots = Float32Array.from({ length: steps + 1 }, (_, k) => {
    const middle = Math.round((k * (values.length - 1)) / steps);
    const near = values.slice(Math.max(0, middle - reach), middle + reach + 1).sort();
    return takeMedian(near.subarray(0, Math.max(1, Math.ceil(0.6 * near.length))));
  });
  return values.map((_, i) => {
    const at = (i * steps) / (values.length - 1);
    const k = Math.min(steps - 1, Math.floor(at));
    return knots[k]! + (at - k) * (knots[k + 1]! - knots[k]!);
  });
}

/**
 * Areas under a lane's profile at given Rf, each from valley to valley, and as shares of their sum. The signal is
 * proportional to the logarithm of the light lost, which grows with the amount on the layer but levels off:
 * areas are semi-quantitative, within one lane and one visualiser.
 */
export function measureAreas(profile: LaneProfile, places: readonly number[]): ProfileArea[] {
  const { rf, signal } = profile;
  const step = rf[1]! - rf[0]!;
  const nearest = (value: number) =>
    Math.max(0, Math.min(rf.length - 1, Math.round((value - rf[0]!) / step)));
  const order = places.map((place, index) => ({ index, at: nearest(place) })).sort((a, b) => a.at - b.at);
  const areas = order.map(({ index, at }, i) => {
    const low = reachDown(signal, at, -1, i > 0 ? order[i - 1]!.at : 0);
    const high = reachDown(signal, at, 1, i < order.length - 1 ? order[i + 1]!.at : rf.length - 1);
    let area = 0;
    for (let k = low; k <= high; k += 1) area += Math.max(0, signal[k]!) * step;
    return { index, rf: places[index]!, fromRf: rf[low]!, toRf: rf[high]!, area };
  });
  const total = areas.reduce((sum, one) => sum + one.area, 0);
  return areas
    .sort((a, b) => a.index - b.index)
    .map(({ index: _index, ...one }) => ({ ...one, shareOfLane: total > 0 ? one.area / total : 0 }));
}

/** From a peak down to the ground or to the lowest place before the next peak. */
function reachDown(signal: Float32Array, at: number, step: 1 | -1, end: number): number {
  let lowest = at;
  for (let k = at; step > 0 ? k <= end : k >= end; k += step) {
    if (signal[k]! < signal[lowest]!) lowest = k;
    if (signal[k]! <= 0.01 * Math.max(1e-9, signal[at]!)) return k;
  }
  return lowest;
}
