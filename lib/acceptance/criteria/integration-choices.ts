import { areaPercentAtSignalToNoise } from '../area-uncertainty';
import type { CriterionResult, JudgeInputs, TraceInput } from '../judge-inputs';

/** S/N of 10 is the quantitation limit (Ph. Eur. 2.2.46; ICH Q2). */
const QUANTITATION = 10;

/** Two peaks this near in time count as one where the blank's peak has no width, min (common practice). */
const NEAREST_MIN = 0.02;

/**
 * Area % under which this integration tells nothing: the larger of what its signal-to-noise quantifies (or the
 * smallest S/N that it was asked to report, if higher) and its disregard limit. Null without either.
 */
export function reportingFloorPercent(trace: TraceInput): number | null {
  const ratio = Math.max(QUANTITATION, trace.minimumSignalToNoise);
  const byNoise = areaPercentAtSignalToNoise(trace.peaks, ratio);
  if (byNoise === null && trace.minimumAreaPercent === 0) return null;
  return Math.max(byNoise ?? 0, trace.minimumAreaPercent);
}

/** The most area % of peaks that somebody's choice of parameters kept out of the table; noise alone is not in it. */
export function hiddenPercent(trace: TraceInput): number {
  const disregarded = trace.disregardedPeakCount * trace.minimumAreaPercent;
  if (trace.minimumSignalToNoise <= QUANTITATION) return disregarded;
  return disregarded + (areaPercentAtSignalToNoise(trace.peaks, trace.minimumSignalToNoise) ?? 0);
}

/** Whether a blank of the run shows a peak at this time: then it does not come from the fraction. */
function blankShows(timeMin: number, traces: TraceInput[]): boolean {
  return traces.some(
    (trace) =>
      trace.subject === 'blank' &&
      trace.peaks.some(
        (peak) =>
          Math.abs(peak.retentionTimeMin - timeMin) <= Math.max(NEAREST_MIN, (peak.widthHalfMin ?? 0) / 2),
      ),
  );
}

function nameRanges(trace: TraceInput): string {
  const ranges = trace.excluded.map(({ fromMin, toMin, reason }) => `${fromMin} to ${toMin} min (${reason})`);
  return ranges.length > 0 ? ` Left out of the sum: ${ranges.join(', ')}.` : '';
}

/**
 * Names the ranges that the integration leaves out, and lets a result pass only where every peak in them is
 * in a blank of the run too: whoever integrates must not choose the verdict (common practice).
 */
export function withExclusions(
  result: CriterionResult,
  trace: TraceInput,
  inputs: JudgeInputs,
): CriterionResult {
  const reason = `${result.reason}${nameRanges(trace)}`;
  const unexplained = trace.excludedPeaks.filter((peak) => !blankShows(peak.retentionTimeMin, inputs.traces));
  if (result.state !== 'pass' || unexplained.length === 0) return { ...result, reason };
  const times = unexplained.map((peak) => `${peak.retentionTimeMin.toFixed(2)} min`).join(', ');
  return {
    ...result,
    state: 'inconclusive',
    reason:
      `The integration leaves out a peak at ${times} that no blank of this run shows.${nameRanges(trace)} ` +
      'Add a blank trace to the run, or integrate without leaving it out.',
  };
}
