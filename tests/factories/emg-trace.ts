/** One exponentially modified Gaussian: `areaUnits` in signal x min; sigma and tau in min; tau 0 is a plain Gaussian. */
export interface EmgPeak {
  atMin: number;
  sigmaMin: number;
  tauMin?: number;
  areaUnits: number;
}

/** exp(x^2) erfc(x) for x >= 0, by its continued fraction, or from the series of erf for small x. */
function scaledErfc(x: number): number {
  if (x < 2.5) {
    let term = x;
    let sum = x;
    for (let n = 1; n < 200; n++) {
      term *= (2 * x * x) / (2 * n + 1);
      sum += term;
      if (term < 1e-18 * sum) break;
    }
    return Math.exp(x * x) - (2 / Math.sqrt(Math.PI)) * sum;
  }
  let fraction = 0;
  for (let k = 120; k >= 1; k--) fraction = k / 2 / (x + fraction);
  return 1 / (Math.sqrt(Math.PI) * (x + fraction));
}

/** Value of the peak at time t. Form of Kalambet et al., J. Chemometrics 25 (2011) 352 (from memory); area is exact. */
export function emgAt(peak: EmgPeak, t: number): number {
  const { atMin, sigmaMin: s, areaUnits } = peak;
  const tau = peak.tauMin ?? 0;
  const d = t - atMin;
  // Under a thousandth of sigma the tail is lost in rounding.
  if (tau < 1e-3 * s) return (areaUnits / (s * Math.sqrt(2 * Math.PI))) * Math.exp(-0.5 * (d / s) ** 2);
  const z = (s / tau - d / s) / Math.SQRT2;
  if (z >= 0) return (areaUnits / (2 * tau)) * Math.exp(-0.5 * (d / s) ** 2) * scaledErfc(z);
  const growing = Math.exp(0.5 * (s / tau) ** 2 - d / tau);
  const mirrored = Math.exp(-0.5 * (d / s) ** 2) * scaledErfc(-z);
  return (areaUnits / (2 * tau)) * (2 * growing - mirrored);
}

/** Repeatable normal noise (mulberry32 and Box-Muller). */
export function seededNormal(seed: number): () => number {
  let state = seed >>> 0;
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
}

/** A trace with exactly known areas. Deterministic: the same options give the same numbers. */
export function buildEmgTrace(options: {
  peaks: EmgPeak[];
  durationMin: number;
  pointCount: number;
  startMin?: number;
  offset?: number;
  driftPerMin?: number;
  bleed?: (t: number) => number;
  noise?: number;
  seed?: number;
}): { timeMin: Float64Array; signal: Float64Array } {
  const {
    peaks,
    durationMin,
    pointCount,
    startMin = 0,
    offset = 0,
    driftPerMin = 0,
    bleed,
    noise = 0,
  } = options;
  const timeMin = new Float64Array(pointCount);
  const signal = new Float64Array(pointCount);
  const normal = seededNormal(options.seed ?? 1);
  for (let i = 0; i < pointCount; i++) {
    const t = startMin + (i * durationMin) / (pointCount - 1);
    timeMin[i] = t;
    signal[i] = offset + driftPerMin * t + (bleed ? bleed(t) : 0) + (noise > 0 ? noise * normal() : 0);
  }
  const step = durationMin / (pointCount - 1);
  for (const peak of peaks) {
    const reach = 12 * peak.sigmaMin + 45 * (peak.tauMin ?? 0);
    const from = Math.max(0, Math.floor((peak.atMin - 12 * peak.sigmaMin - startMin) / step));
    const to = Math.min(pointCount - 1, Math.ceil((peak.atMin + reach - startMin) / step));
    for (let i = from; i <= to; i++) signal[i]! += emgAt(peak, timeMin[i]!);
  }
  return { timeMin, signal };
}
