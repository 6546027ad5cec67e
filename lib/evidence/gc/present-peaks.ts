import type { Peak, PeakFlag } from './integration';
import type { MeasuredPeak } from './measure-cluster';
import { plateNumber, resolution, signalToNoise, symmetryFactor, timeAt } from './peak-figures';

/** S/N of 10 is the quantitation limit (Ph. Eur. 2.2.46; ICH Q2). */
const quantitationSignalToNoise = 10;
/** Fewer points than this over the width at half height do not carry an area (common practice). */
const fewestPointsOverHalfWidth = 5;

/** The figures of the pharmacopoeias for measured peaks, numbered in order of time. `areas` belong to the peaks one by one. */
export function buildPeaks(
  timeMin: Float64Array,
  measured: { peak: MeasuredPeak; area: number; extraFlags: PeakFlag[] }[],
  peakToPeakNoise: number,
): Peak[] {
  const totalArea = measured.reduce((sum, entry) => sum + entry.area, 0);
  let previous: Peak | null = null;
  return measured.map(({ peak, area, extraFlags }, k) => {
    const at = (index: number) => timeAt(timeMin, index);
    const retentionTimeMin = at(peak.apexIndex);
    const widthHalfMin =
      peak.halfFrom === null || peak.halfTo === null ? null : at(peak.halfTo) - at(peak.halfFrom);
    const tailing =
      peak.twentiethFrom === null || peak.twentiethTo === null
        ? null
        : symmetryFactor(
            at(peak.twentiethTo) - at(peak.twentiethFrom),
            retentionTimeMin - at(peak.twentiethFrom),
          );
    const ratio = signalToNoise(peak.height, peakToPeakNoise);
    const flags = [...peak.flags, ...extraFlags];
    if (
      peak.halfFrom !== null &&
      peak.halfTo !== null &&
      peak.halfTo - peak.halfFrom < fewestPointsOverHalfWidth
    ) {
      flags.push('few points');
    }
    if (ratio < quantitationSignalToNoise) flags.push('under the quantitation limit');
    const result: Peak = {
      number: k + 1,
      retentionTimeMin,
      startMin: at(peak.start),
      endMin: at(peak.end),
      area,
      areaPercent: totalArea > 0 ? (100 * area) / totalArea : 0,
      height: peak.height,
      widthHalfMin,
      tailing,
      plates:
        widthHalfMin === null || retentionTimeMin <= 0 ? null : plateNumber(retentionTimeMin, widthHalfMin),
      resolution:
        previous === null || previous.widthHalfMin === null || widthHalfMin === null
          ? null
          : resolution(
              { retentionTimeMin: previous.retentionTimeMin, widthHalfMin: previous.widthHalfMin },
              { retentionTimeMin, widthHalfMin },
            ),
      signalToNoise: ratio,
      flags,
    };
    previous = result;
    return result;
  });
}
