import { z } from 'zod';
import { areaPercentUncertainty, showAreaUncertainty } from '../area-uncertainty';
import type { CriterionResult, JudgeInputs } from '../judge-inputs';
import { targetPurity } from '../target-purity';
import { AREA_SOURCE, integratedTraces, worstOf } from './gc-main-peak';
import { reportingFloorPercent, withExclusions } from './integration-choices';
import { criterion, decideLimit } from './kind';

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
      const least = reportingFloorPercent(trace);
      const others = trace.peaks.filter((peak) => !purity.peakNumbers.includes(peak.number));
      const [largest] = others.sort((a, b) => b.areaPercent - a.areaPercent);
      if (least !== null && least > limit && (largest?.areaPercent ?? 0) <= limit) {
        const remedy =
          least === trace.minimumAreaPercent
            ? `It leaves out every peak under ${least} %: more than the limit. Integrate with a lower disregard limit.`
            : `The trace quantifies from ${least.toPrecision(2)} % on (S/N ${Math.max(10, trace.minimumSignalToNoise)}): more than the limit. Inject more, or report from a lower S/N.`;
        const facts = { ...base, measured: null, uncertainty: null, reason: remedy };
        return withExclusions({ ...facts, state: 'inconclusive' }, trace, inputs);
      }
      if (!largest) {
        const under = least === null ? 'no other peak' : `no other peak over ${least.toPrecision(2)} %`;
        const facts = { ...base, measured: under, uncertainty: null, reason: 'Only the target shows.' };
        return withExclusions({ ...facts, state: 'pass' }, trace, inputs);
      }
      const u = areaPercentUncertainty(trace.peaks, [largest.number]);
      const result = decideLimit({
        facts: {
          ...base,
          measured: `${largest.areaPercent.toFixed(2)} %`,
          uncertainty: showAreaUncertainty(u),
        },
        measured: largest.areaPercent,
        uncertainty: u,
        limit,
        side: 'at most',
        rule,
        remedy: 'Inject more, or improve signal-to-noise.',
      });
      const where = `Peak ${largest.number} at ${largest.retentionTimeMin.toFixed(2)} min${nameOf(inputs, largest.compoundId)}.`;
      return withExclusions({ ...result, reason: `${result.reason} ${where}` }, trace, inputs);
    });
    return [worstOf(results)];
  },
});
