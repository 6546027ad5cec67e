import { chanceFor } from './random';
import type { Composition } from './run-plan';
import { requireSubstance, WATER } from './substances';

const DURATION_MIN = 15;
const POINTS = 4500;
const SIGMA_MIN = 0.028;
const TAU_MIN = 0.012;
/** Detector unit times min over all peaks. */
const WHOLE_AREA = 60;

/** exp(x^2) erfc(x) for any x: a rational fit (Abramowitz and Stegun 7.1.26, error under 1.5e-7) where x >= 0. */
function scaledErfc(x: number): number {
  if (x < 0) return 2 * Math.exp(x * x) - scaledErfc(-x);
  const t = 1 / (1 + 0.3275911 * x);
  return t * (0.254829592 + t * (-0.284496736 + t * (1.421413741 + t * (-1.453152027 + t * 1.061405429))));
}

/** An exponentially modified Gaussian of area 1 around `atMin`: how a peak tails. */
function peakAt(minutes: number, atMin: number): number {
  const distance = (minutes - atMin) / SIGMA_MIN;
  const z = (SIGMA_MIN / TAU_MIN - distance) / Math.SQRT2;
  return (Math.exp(-0.5 * distance ** 2) * scaledErfc(z)) / (2 * TAU_MIN);
}

/** Area per cent that a detector would show: by mass, without water where it sees none. */
export function areaPercents(
  composition: Composition,
  detector: 'FID' | 'TCD',
): [cas: string, percent: number][] {
  const seen = Object.entries(composition).filter(([cas]) => detector === 'TCD' || cas !== WATER);
  const whole = seen.reduce((sum, [, percent]) => sum + percent, 0);
  return seen.map(([cas, percent]) => [cas, (100 * percent) / whole]);
}

/**
 * The table of an invented gas chromatogram: time in min and signal in pA (FID) or µV (TCD), with noise, a slow drift
 * and peaks that tail. The same key gives the same bytes.
 */
export function writeTrace(key: string, composition: Composition, detector: 'FID' | 'TCD'): Buffer {
  const chance = chanceFor(`trace ${key}`);
  const shift = 0.012 * chance.normal();
  const peaks = areaPercents(composition, detector).flatMap(([cas, percent]) =>
    requireSubstance(cas).peaks.map(({ atMin, share }) => ({
      atMin: atMin + shift,
      area: (WHOLE_AREA * percent * share) / 100,
    })),
  );
  const lines = [
    `# Invented demo measurement: ${key}. Detector: ${detector}`,
    `time (min),signal (${detector === 'FID' ? 'pA' : 'µV'})`,
  ];
  for (let at = 0; at < POINTS; at += 1) {
    const minutes = (at * DURATION_MIN) / (POINTS - 1);
    let signal = 8 + 0.03 * minutes + 0.018 * chance.normal();
    for (const { atMin, area } of peaks)
      if (Math.abs(minutes - atMin) < 0.6) signal += area * peakAt(minutes, atMin);
    lines.push(`${minutes.toFixed(5)},${signal.toFixed(4)}`);
  }
  return Buffer.from(`${lines.join('\n')}\n`, 'utf8');
}
