import { curvatureAt, curvatureNoiseGain } from './curvature';
import { quantileInPlace } from './quantile';

const sampleLimit = 20_000;
/** |x| of a normal variable lies under 0.4307 standard deviations in a third of all cases. */
const lowerThirdOfNormal = 0.4307;

export interface NoiseLevels {
  /** Standard deviation of the points of each pyramid level, white part. */
  levelDeviation: Float64Array;
  quantisationStep: number | null;
}

/**
 * Step of an analogue-to-digital converter that is coarser than the noise, or null. On such a trace most
 * differences are almost nothing and the others are whole steps, so a median of differences would say
 * that there is no noise at all. The step is taken only if nine tenths of the small jumps are whole
 * multiples of it.
 */
export function findQuantisationStep(signal: Float64Array): number | null {
  const stride = Math.max(1, Math.floor((signal.length - 1) / sampleLimit));
  const jumps = new Float64Array(Math.floor((signal.length - 1) / stride));
  for (let k = 0; k < jumps.length; k++) jumps[k] = Math.abs(signal[k * stride + 1]! - signal[k * stride]!);
  jumps.sort();
  let first = 0;
  while (first < jumps.length && jumps[first]! === 0) first++;
  const start = Math.max(first, Math.floor(jumps.length * 0.02));
  for (let k = start; k < jumps.length * 0.95; k++) {
    const below = k === 0 ? 0 : jumps[k - 1]!;
    const step = jumps[k]!;
    if (below * 20 >= step || k < jumps.length * 0.1) continue;
    let whole = 0;
    let counted = 0;
    for (let j = k; j < jumps.length && jumps[j]! < 8.5 * step; j++, counted++) {
      const steps = jumps[j]! / step;
      if (Math.abs(steps - Math.round(steps)) < 0.1) whole++;
    }
    if (counted >= 20 && whole >= 0.9 * counted && jumps[k + Math.floor(counted / 4)]! < 1.1 * step)
      return step;
  }
  return null;
}

/**
 * Noise of each pyramid level from its five-point second differences: their lower third is hardly touched by
 * peaks (which cover the minority of the points) and not at all by drift. Units of the signal.
 * A trace without noise gets a floor of 1e-9 of its `range` (highest minus lowest value), so that a threshold exists.
 */
export function estimateNoiseLevels(levels: Float64Array[], range: number): NoiseLevels {
  const floor = 1e-9 * range;
  const quantisationStep = findQuantisationStep(levels[0]!);
  const levelDeviation = new Float64Array(levels.length);
  const scratch = new Float64Array(sampleLimit + 1);
  levels.forEach((points, level) => {
    const inner = points.length - 4;
    const stride = Math.max(1, Math.ceil(inner / sampleLimit));
    let count = 0;
    for (let i = 2; i < points.length - 2 && count < scratch.length; i += stride) {
      const size = Math.abs(curvatureAt(points, i));
      if (size > 0) scratch[count++] = size;
    }
    const third = count === 0 ? 0 : quantileInPlace(scratch, 1 / 3, count);
    const fromCurvature = third / lowerThirdOfNormal / curvatureNoiseGain;
    const fromSteps = quantisationStep === null ? 0 : (0.3 * quantisationStep) / Math.sqrt(2 ** level);
    levelDeviation[level] = Math.max(floor, fromCurvature, fromSteps);
  });
  return { levelDeviation, quantisationStep };
}

/** Slope per point of a stretch, from the means of its first and last third. */
function straightSlope(points: Float64Array, from: number, length: number): number {
  const third = Math.floor(length / 3);
  let first = 0;
  let last = 0;
  for (let i = 0; i < third; i++) {
    first += points[from + i]!;
    last += points[from + length - 1 - i]!;
  }
  return (last - first) / third / (length - third);
}

/**
 * Peak-to-peak noise h, straight drift taken off: the median range over stretches without a peak, each 20 times the half-height width
 * long (Ph. Eur. 2.2.46; at least 5 times where no longer stretch exists, USP <621>). Where no
 * stretch is long enough, six standard deviations (common practice).
 */
export function peakToPeakNoise(
  corrected: Float64Array,
  gaps: { from: number; to: number }[],
  halfWidthPoints: number,
  standardDeviation: number,
): { peakToPeak: number; method: string } {
  for (const times of [20, 10, 5]) {
    const length = Math.max(30, Math.round(times * halfWidthPoints));
    const ranges: number[] = [];
    for (const gap of gaps) {
      for (let from = gap.from; from + length <= gap.to; from += length) {
        const slope = straightSlope(corrected, from, length);
        let low = Infinity;
        let high = -Infinity;
        for (let i = from; i < from + length; i++) {
          const value = corrected[i]! - slope * (i - from);
          if (value < low) low = value;
          if (value > high) high = value;
        }
        ranges.push(high - low);
      }
    }
    if (ranges.length === 0) continue;
    ranges.sort((a, b) => a - b);
    const median = ranges[ranges.length >> 1]!;
    return {
      peakToPeak: Math.max(median, 2 * standardDeviation),
      method: `median range over ${ranges.length} stretches of ${length} points without a peak`,
    };
  }
  return { peakToPeak: 6 * standardDeviation, method: 'six standard deviations of the point-to-point noise' };
}
