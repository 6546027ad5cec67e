import { checkTrace, samplingUnevenness } from './check-trace';
import { detectPeakCandidates } from './detect-peaks';
import type { ExcludedPeak, Integration, NegativeDip, PeakFlag } from './integration';
import type { MeasuredPeak } from './measure-cluster';
import type { Dip } from './negative-dips';
import { estimateNoiseLevels } from './noise';
import {
  integrationMethodVersion,
  integrationParametersSchema,
  type IntegrationParameters,
  type IntegrationParametersInput,
} from './parameters';
import { timeAt, trapezoidArea } from './peak-figures';
import { buildPeaks } from './present-peaks';
import { buildPyramid } from './pyramid';
import { resolvePeaks, type ResolvedTrace } from './resolve-peaks';
import { findPlateau } from './saturation';
import { smoothSavitzkyGolay } from './smooth';
import { subtractBlank } from './subtract-blank';

/** Under this many points nothing can be told about noise, baseline or peaks. */
const fewestPoints = 10;

export interface Trace {
  timeMin: Float64Array;
  signal: Float64Array;
}

function emptyIntegration(flag: string): Integration {
  return {
    methodVersion: integrationMethodVersion,
    noise: { standardDeviation: 0, peakToPeak: 0, quantisationStep: null, method: 'not measured' },
    flags: [flag],
    peaks: [],
    totalArea: 0,
    excludedPeaks: [],
    negativeDips: [],
    disregardedPeakCount: 0,
    baseline: { timeMin: [], signal: [] },
  };
}

/** Area of a peak without the part that dips under the baseline. */
function areaWithoutDips(trace: Trace, corrected: Float64Array, peak: MeasuredPeak, dips: Dip[]): number {
  let area = peak.area;
  if (peak.skimmed) return area;
  for (const dip of dips) {
    const from = Math.max(dip.from, peak.start);
    const to = Math.min(dip.to - 1, peak.end);
    if (to > from) area -= trapezoidArea(trace.timeMin, (i) => corrected[i]!, from, to);
  }
  return area;
}

function edgeAndPlateauFlags(
  signal: Float64Array,
  corrected: Float64Array,
  peak: MeasuredPeak,
  range: { low: number; high: number },
  quantisationStep: number | null,
): PeakFlag[] {
  const flags: PeakFlag[] = [];
  const cut = (index: number) => corrected[index]! > 0.02 * peak.height;
  if (peak.start === 0 && cut(0)) flags.push('cut at the start of the trace');
  if (peak.end === signal.length - 1 && cut(signal.length - 1)) flags.push('cut at the end of the trace');
  const width = peak.halfFrom === null || peak.halfTo === null ? null : peak.halfTo - peak.halfFrom;
  let top = peak.top.highest;
  for (let i = peak.top.candidate.from; i <= peak.top.candidate.to; i++)
    if (signal[i]! > signal[top]!) top = i;
  const plateau = findPlateau(
    signal,
    top,
    range.high,
    range.high - range.low,
    width,
    peak.height,
    quantisationStep,
  );
  if (plateau) {
    flags.push('detector saturated');
    peak.apexIndex = (plateau.from + plateau.to) / 2;
  }
  return flags;
}

/** Drops peaks under the disregard limit, smallest share first, until every one left is over it. */
function overDisregardLimit<T extends { area: number }>(entries: T[], minimumAreaPercent: number): T[] {
  let kept = entries;
  for (;;) {
    const total = kept.reduce((sum, entry) => sum + entry.area, 0);
    const next = kept.filter((entry) => 100 * entry.area >= minimumAreaPercent * total);
    if (next.length === kept.length) return kept;
    kept = next;
  }
}

function describeFlags(
  resolved: ResolvedTrace,
  trace: Trace,
  counts: { dips: number; saturated: boolean },
): string[] {
  const flags: string[] = [];
  if (resolved.peaks.length === 0) flags.push('no peak found');
  if (counts.saturated) flags.push('detector saturated');
  if (counts.dips > 0) flags.push('negative dips kept out of the sum');
  if (resolved.withoutGap) flags.push('no stretch without a peak: baseline drawn through the lowest points');
  if (samplingUnevenness(trace.timeMin) > 1.5) flags.push('time steps are uneven');
  return flags;
}

function valueRange(signal: Float64Array): { low: number; high: number } {
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < signal.length; i++) {
    const value = signal[i]!;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return { low, high };
}

/**
 * Integrates a chromatogram: noise, baseline, peaks with their areas and the figures of USP <621> and Ph. Eur. 2.2.46.
 *
 * Times in minutes, rising; areas in signal x min. The same points and parameters give the same
 * numbers, bit for bit. Shifting the time or adding a constant to the signal changes no area; scaling the signal scales them.
 * A trace without peaks gives an empty table and a flag; nothing is ever invented.
 *
 * @throws TraceProblem when a point is not a number or the times do not rise
 * @throws ZodError when a parameter is outside its limits
 */
export function integrate(
  recorded: Trace,
  parametersInput: IntegrationParametersInput = {},
  blank: Trace | null = null,
): Integration {
  const parameters: IntegrationParameters = integrationParametersSchema.parse(parametersInput);
  checkTrace(recorded.timeMin, recorded.signal);
  if (blank) checkTrace(blank.timeMin, blank.signal);
  if (recorded.signal.length < fewestPoints) return emptyIntegration('too few points to integrate');

  const { timeMin } = recorded;
  let signal = blank ? subtractBlank(timeMin, recorded.signal, blank) : recorded.signal;
  if (parameters.smoothing && signal.length > parameters.smoothing.windowPoints) {
    signal = smoothSavitzkyGolay(signal, parameters.smoothing.windowPoints, parameters.smoothing.order);
  }
  const range = valueRange(signal);
  if (range.high === range.low) return emptyIntegration('the signal is constant');

  const trace: Trace = { timeMin, signal };
  const levels = buildPyramid(signal);
  const noiseLevels = estimateNoiseLevels(levels, range.high - range.low);
  const candidates = detectPeakCandidates(levels, noiseLevels.levelDeviation);
  const resolved = resolvePeaks(timeMin, signal, levels, noiseLevels, candidates, parameters);
  const { corrected, noise, dips } = resolved;

  const deviation = noiseLevels.levelDeviation[0]!;

  const excludedPeaks: ExcludedPeak[] = [];
  const counted: { peak: MeasuredPeak; area: number; extraFlags: PeakFlag[] }[] = [];
  for (const peak of resolved.peaks) {
    const extraFlags = edgeAndPlateauFlags(signal, corrected, peak, range, noiseLevels.quantisationStep);
    const area = areaWithoutDips(trace, corrected, peak, dips);
    const at = timeAt(timeMin, peak.apexIndex);
    const exclusion = parameters.exclude.find(
      (candidate) => at >= candidate.fromMin && at <= candidate.toMin,
    );
    if (exclusion)
      excludedPeaks.push({ retentionTimeMin: at, area, height: peak.height, reason: exclusion.reason });
    else counted.push({ peak, area, extraFlags });
  }
  const kept = overDisregardLimit(counted, parameters.minimumAreaPercent);
  const saturated = kept.some((entry) => entry.extraFlags.includes('detector saturated'));
  const negativeDips: NegativeDip[] = dips.map((dip) => ({
    startMin: timeMin[dip.from]!,
    endMin: timeMin[dip.to - 1]!,
    lowestMin: timeMin[dip.lowest]!,
    depth: dip.depth,
    area: trapezoidArea(timeMin, (i) => corrected[i]!, dip.from, dip.to - 1),
  }));
  return {
    methodVersion: integrationMethodVersion,
    noise: {
      standardDeviation: deviation,
      peakToPeak: noise.peakToPeak,
      quantisationStep: noiseLevels.quantisationStep,
      method: noise.method,
    },
    flags: describeFlags(resolved, trace, { dips: dips.length, saturated }),
    peaks: buildPeaks(timeMin, kept, noise.peakToPeak),
    totalArea: kept.reduce((sum, entry) => sum + entry.area, 0),
    excludedPeaks,
    negativeDips,
    disregardedPeakCount: counted.length - kept.length,
    baseline: {
      timeMin: resolved.nodes.map((node) => timeAt(timeMin, node.index)),
      signal: resolved.nodes.map((node) => node.level),
    },
  };
}
