import { areaPercentAtSignalToNoise } from '../area-uncertainty';
import type { CompoundFacts, CoverageCell, JudgeInputs, PeakInput, TraceInput } from '../judge-inputs';
import { targetPurity } from '../target-purity';
import { detectorSight } from './detector';

/** S/N of 3 is the detection limit (Ph. Eur. 2.2.46; ICH Q2). */
const DETECTION = 3;

/** Retention times at which a compound was assigned in any trace of the run, minutes. */
function knownTimes(traces: TraceInput[], compoundId: string): number[] {
  return traces.flatMap((trace) =>
    trace.peaks.filter((peak) => peak.compoundId === compoundId).map((peak) => peak.retentionTimeMin),
  );
}

/** Peaks closer than half the sum of their widths at half height count as one (Rs about 0.6). */
function coElutes(timeMin: number, peak: PeakInput): boolean {
  return peak.widthHalfMin !== null && Math.abs(timeMin - peak.retentionTimeMin) < peak.widthHalfMin;
}

/** What one trace of the fraction shows of a compound: detector, excluded ranges, co-elution, noise. */
export function gcCell(trace: TraceInput, compound: CompoundFacts, inputs: JudgeInputs): CoverageCell {
  const test = `GC, ${trace.detector}`;
  const sight = detectorSight(trace.detector, compound);
  if (!sight.sees) return { test, state: 'blind', reason: `Blind: ${sight.reason}` };
  if (trace.peaks.length === 0)
    return {
      test,
      state: 'blind',
      reason: 'The trace shows no peak, not even the target: it proves nothing.',
    };
  const own = trace.peaks.filter((peak) => peak.compoundId === compound.id);
  const limit = areaPercentAtSignalToNoise(trace.peaks, DETECTION);
  const sees = { test, state: 'sees' as const, ...(limit === null ? {} : { limitPercent: limit }) };
  if (own.length > 0) {
    const measured = own.reduce((sum, peak) => sum + peak.areaPercent, 0);
    return { ...sees, reason: `Its peak is assigned: ${measured.toFixed(2)} area %.` };
  }
  const times = knownTimes(inputs.traces, compound.id);
  const hidden = trace.excluded.find((range) => times.some((t) => t >= range.fromMin && t <= range.toMin));
  if (hidden) {
    const reason = `Its peak lies in the excluded range ${hidden.fromMin} to ${hidden.toMin} min.`;
    return { test, state: 'blind', reason };
  }
  const targetPeaks = targetPurity(trace.peaks, inputs.target.id)?.peakNumbers ?? [];
  const under = trace.peaks.find(
    (peak) => targetPeaks.includes(peak.number) && times.some((t) => coElutes(t, peak)),
  );
  if (under) {
    const reason = `It leaves the column with the target, at ${under.retentionTimeMin.toFixed(2)} min: one peak for both.`;
    return { test, state: 'blind', reason };
  }
  const place =
    times.length > 0
      ? 'Separated from the target in a trace of this run.'
      : 'Where its peak would be is not shown by a reference or the crude of this run.';
  const limits = limit === null ? '' : ' Limit at S/N 3, as area %.';
  return { ...sees, reason: `${sight.reason} ${place}${limits}` };
}

/** A gas chromatogram that was not made: whether its detector would answer. */
export function gcNotDone(detector: string, compound: CompoundFacts): CoverageCell {
  const sight = detectorSight(detector, compound);
  const would = sight.sees ? 'it would see it' : 'it would not help';
  return {
    test: `GC, ${detector}`,
    state: 'not done',
    wouldSee: sight.sees,
    reason: `Not done; ${would}: ${sight.reason}`,
  };
}
