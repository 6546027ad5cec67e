import { z } from 'zod';
import { areaPercentAtSignalToNoise, areaPercentUncertainty } from '../area-uncertainty';
import type { CriterionResult, JudgeInputs } from '../judge-inputs';
import { targetPurity } from '../target-purity';
import { AREA_SOURCE, integratedTraces, worstOf } from './gc-main-peak';
import { criterion, decideLimit } from './kind';

/** S/N of 10 is the quantitation limit (Ph. Eur. 2.2.46; ICH Q2). */
const QUANTITATION = 10;

function nameOf(inputs: JudgeInputs, compoundId: string | null): string {
  const known = [...inputs.knownImpurities, inputs.water].find((compound) => compound.id === compoundId);
  return known ? ` (${known.name})` : '';
}

export const gcSingleImpurity = criterion({
  name: 'GC, largest single impurity',
  schema: z.number().gt(0).max(100).describe('most area % of any one peak but the target'),
  evaluate(inputs, limit, rule) {
    const base = {
      name: 'GC, largest single impurity',
      limit: `at most ${limit} %`,
      source: AREA_SOURCE,
    };
    const traces = integratedTraces(inputs.traces);
    if (traces.length === 0) {
      const reason = 'No gas chromatogram of this fraction has been integrated. Add one.';
      return [{ ...base, state: 'missing', measured: null, uncertainty: null, reason }];
    }
    const results = traces.map((trace): CriterionResult => {
      const purity = targetPurity(trace.peaks, inputs.target.id);
      if (!purity) {
        const reason = 'It is not known which peak is the target. Assign the peaks.';
        return { ...base, state: 'inconclusive', measured: null, uncertainty: null, reason };
      }
      const least = areaPercentAtSignalToNoise(trace.peaks, QUANTITATION);
      const others = trace.peaks.filter((peak) => !purity.peakNumbers.includes(peak.number));
      const [largest] = others.sort((a, b) => b.areaPercent - a.areaPercent);
      if (least !== null && least > limit && (largest?.areaPercent ?? 0) <= limit) {
        const reason = `The trace quantifies from ${least.toPrecision(2)} % on (S/N 10): more than the limit. Inject more.`;
        return { ...base, state: 'inconclusive', measured: null, uncertainty: null, reason };
      }
      if (!largest) {
        const under = least === null ? 'no other peak' : `no other peak over ${least.toPrecision(2)} %`;
        return {
          ...base,
          state: 'pass',
          measured: under,
          uncertainty: null,
          reason: 'Only the target shows.',
        };
      }
      const u = areaPercentUncertainty(trace.peaks, [largest.number]);
      const result = decideLimit({
        facts: {
          ...base,
          measured: `${largest.areaPercent.toFixed(2)} %`,
          uncertainty: u === null ? null : `± ${u.toPrecision(2)} %`,
        },
        measured: largest.areaPercent,
        uncertainty: u,
        limit,
        side: 'at most',
        rule,
        remedy: 'Inject more, or improve signal-to-noise.',
      });
      const where = `Peak ${largest.number} at ${largest.retentionTimeMin.toFixed(2)} min${nameOf(inputs, largest.compoundId)}.`;
      return { ...result, reason: `${result.reason} ${where}` };
    });
    return [worstOf(results)];
  },
});
