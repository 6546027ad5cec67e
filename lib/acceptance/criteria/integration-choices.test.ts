import { describe, expect, it } from 'vitest';
import { areaPercentUncertainty, showAreaUncertainty } from '../area-uncertainty';
import { bare, ethanol, ethylAcetate, gcTrace } from '../compound-facts.fixture';
import type { JudgeInputs, TraceInput } from '../judge-inputs';
import { judge } from '../verdict';

const limits = { gcAreaPercentMin: 98, gcSingleImpurityMaxPercent: 0.5 };

/** Only the target in the table: what an integration shows after it hid everything else. */
function onlyTarget(choices: Partial<TraceInput> = {}): TraceInput {
  const trace = gcTrace(ethylAcetate);
  const main = { ...trace.peaks[0]!, areaPercent: 100 };
  return { ...trace, peaks: [main], ...choices };
}

function judged(...traces: TraceInput[]) {
  const inputs: JudgeInputs = {
    ...bare(ethylAcetate, ethanol),
    traces,
    specification: { id: 's', grade: 'g', edition: 1, decisionRule: 'guarded', criteria: limits },
  };
  const { state, criteria } = judge(inputs);
  return { state, main: criteria[0]!, single: criteria[1]! };
}

const hexane = { retentionTimeMin: 3.2, area: 4 };
const solventRange = { fromMin: 3, toMin: 3.5, reason: 'solvent' };

describe('parameters of an integration and the verdict', () => {
  it('passes a clean trace at the default limits', () => {
    expect(judged(onlyTarget()).state).toBe('pass');
  });
  it('does not pass an impurity limit under the disregard limit (reporting threshold, Ph. Eur. 2.2.46)', () => {
    const { state, single } = judged(onlyTarget({ minimumAreaPercent: 5, disregardedPeakCount: 1 }));
    expect(state).toBe('inconclusive');
    expect(single).toMatchObject({ state: 'inconclusive', measured: null });
    expect(single.reason).toContain('under 5 %');
  });
  it('does not pass a purity that disregarded peaks could break', () => {
    const { main } = judged(onlyTarget({ minimumAreaPercent: 5, disregardedPeakCount: 1 }));
    expect(main.state).toBe('inconclusive');
    expect(main.reason).toContain('up to 5.0 %');
    expect(judged(onlyTarget({ minimumAreaPercent: 0.01, disregardedPeakCount: 3 })).main.state).toBe('pass');
  });
  it('does not pass what a high smallest S/N keeps out', () => {
    // Main peak S/N 10 000: a smallest S/N of 300 hides up to 3 %.
    const { main, single } = judged(onlyTarget({ minimumSignalToNoise: 300 }));
    expect([main.state, single.state]).toEqual(['inconclusive', 'inconclusive']);
    expect(single.reason).toContain('S/N 300');
  });
  it('does not pass with an excluded peak that no blank shows, and names the range and its reason', () => {
    const trace = onlyTarget({ excluded: [solventRange], excludedPeaks: [hexane] });
    const { state, main, single } = judged(trace);
    expect(state).toBe('inconclusive');
    for (const { reason } of [main, single]) {
      expect(reason).toContain('3.20 min');
      expect(reason).toContain('3 to 3.5 min (solvent)');
    }
  });
  it('passes where a blank has the excluded peak at the same time, not elsewhere in the range', () => {
    const trace = onlyTarget({ excluded: [solventRange], excludedPeaks: [hexane] });
    const blankAt = (retentionTimeMin: number): TraceInput => ({
      ...gcTrace(ethylAcetate),
      subject: 'blank',
      peaks: [{ ...gcTrace(ethylAcetate).peaks[0]!, retentionTimeMin, compoundId: null }],
    });
    expect(judged(trace, blankAt(3.21)).state).toBe('pass');
    expect(judged(trace, blankAt(3.21)).main.reason).toContain('(solvent)');
    expect(judged(trace, blankAt(3.4)).state).toBe('inconclusive');
  });
  it('never turns a fail to inconclusive by leaving something out', () => {
    const trace = {
      ...gcTrace(ethylAcetate, { areaPercent: 4 }),
      excluded: [solventRange],
      excludedPeaks: [hexane],
    };
    expect(judged(trace).state).toBe('fail');
  });
});

describe('uncertainty of an area per cent', () => {
  it('is never under what noise adds to a peak too small to see', () => {
    // S/N 10 000 at 100 %: noise of k = 2 is 2 x 100/10 000.
    expect(areaPercentUncertainty(onlyTarget().peaks, [1])).toBeCloseTo(0.02, 10);
  });
  it('is shown without powers of ten', () => {
    expect(showAreaUncertainty(3.5e-18)).toBe('± less than 0.001 %');
    expect(showAreaUncertainty(0.198)).toBe('± 0.20 %');
    expect(showAreaUncertainty(null)).toBeNull();
  });
});
