import type { PeakInput } from './judge-inputs';

/**
 * Expanded uncertainty (k = 2) of the area per cent of some peaks, from noise alone: propagation
 * (JCGM 100:2008, 5.1.2) with 1/(S/N) as relative standard uncertainty of each area. S/N = 2H/h
 * (Ph. Eur. 2.2.46) with h about five standard deviations of the noise, so that 1/(S/N) is more than
 * noise adds to a height (0.4 of it) and leaves room for the baseline (common practice). Response
 * factors are taken as equal and are not in it. Never under what noise adds to a peak too small to be seen
 * (the area per cent at S/N 2, by the same formula): a trace with one peak is not free of error. Null where a
 * peak has no S/N.
 */
export function areaPercentUncertainty(peaks: PeakInput[], ofNumbers: readonly number[]): number | null {
  if (peaks.some((peak) => peak.signalToNoise === null || peak.signalToNoise <= 0)) return null;
  const share = peaks
    .filter((peak) => ofNumbers.includes(peak.number))
    .reduce((sum, peak) => sum + peak.areaPercent / 100, 0);
  const variance = peaks.reduce((sum, peak) => {
    const u = peak.areaPercent / (peak.signalToNoise as number);
    const sensitivity = ofNumbers.includes(peak.number) ? 1 - share : -share;
    return sum + (sensitivity * u) ** 2;
  }, 0);
  return Math.max(2 * Math.sqrt(variance), areaPercentAtSignalToNoise(peaks, 2) ?? 0);
}

/** The expanded uncertainty of an area per cent as people read it; null where it is not known. */
export function showAreaUncertainty(uncertaintyPercent: number | null): string | null {
  if (uncertaintyPercent === null) return null;
  return uncertaintyPercent < 0.001 ? '± less than 0.001 %' : `± ${uncertaintyPercent.toPrecision(2)} %`;
}

/** The smallest area per cent that reaches a signal-to-noise ratio, told from the highest peak; null without S/N. */
export function areaPercentAtSignalToNoise(peaks: PeakInput[], signalToNoise: number): number | null {
  const measured = peaks.filter((peak) => peak.signalToNoise !== null && peak.signalToNoise > 0);
  const [main] = [...measured].sort((a, b) => b.areaPercent - a.areaPercent);
  return main ? (main.areaPercent * signalToNoise) / (main.signalToNoise as number) : null;
}
