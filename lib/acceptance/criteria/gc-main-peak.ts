import { z } from 'zod';
import { areaPercentUncertainty, showAreaUncertainty } from '../area-uncertainty';
import type { CriterionResult, TraceInput } from '../judge-inputs';
import { targetPurity } from '../target-purity';
import { hiddenPercent, withExclusions } from './integration-choices';
import { criterion, decideLimit } from './kind';

export const AREA_SOURCE =
  'area normalisation, USP <621> and Ph. Eur. 2.2.46; U (k = 2) from signal-to-noise alone';

/** The fraction's own traces that have been integrated. */
export function integratedTraces(traces: TraceInput[]): TraceInput[] {
  return traces.filter((trace) => trace.subject === 'fraction' && trace.integrationNumber !== null);
}

const order = ['fail', 'blind', 'missing', 'inconclusive', 'pass'] as const;

/** Of one result a trace the worst: a second injection never hides the first. */
export function worstOf(results: CriterionResult[]): CriterionResult {
  const [worst] = [...results].sort((a, b) => order.indexOf(a.state) - order.indexOf(b.state));
  if (!worst) throw new Error('worstOf needs at least one result');
  return results.length === 1
    ? worst
    : { ...worst, reason: `${worst.reason} Of ${results.length} traces the one that decides worst.` };
}

export const gcMainPeak = criterion({
  name: 'GC area % of the target',
  schema: z.number().min(0).max(100).describe('least area % of the target'),
  evaluate(inputs, limit, rule) {
    const name = 'GC area % of the target';
    const base = { name, limit: `at least ${limit} %`, source: AREA_SOURCE };
    const traces = integratedTraces(inputs.traces);
    if (traces.length === 0) {
      const reason = 'No gas chromatogram of this fraction has been integrated. Add one.';
      return [{ ...base, state: 'missing', measured: null, uncertainty: null, reason }];
    }
    const results = traces.map((trace): CriterionResult => {
      const purity = targetPurity(trace.peaks, inputs.target.id);
      if (!purity) {
        const reason =
          trace.peaks.length === 0
            ? 'The integration in force has no peaks. Check the trace and integrate it again.'
            : 'The largest peak is assigned to another compound and none to the target. Assign the peaks.';
        return { ...base, state: 'inconclusive', measured: null, uncertainty: null, reason };
      }
      const u = areaPercentUncertainty(trace.peaks, purity.peakNumbers);
      const said =
        purity.basis === 'assigned'
          ? `Peak ${purity.peakNumbers.join(' + ')} is assigned to ${inputs.target.name}.`
          : `No peak is assigned to ${inputs.target.name}: the largest, peak ${purity.peakNumbers[0]}, was taken.`;
      const result = decideLimit({
        facts: {
          ...base,
          measured: `${purity.areaPercent.toFixed(2)} %`,
          uncertainty: showAreaUncertainty(u),
        },
        measured: purity.areaPercent,
        uncertainty: u,
        limit,
        side: 'at least',
        rule,
        remedy: 'Inject more, or improve signal-to-noise.',
      });
      // What is not listed takes its share from the target: 100 p / (100 + hidden).
      const hidden = hiddenPercent(trace);
      const least = (100 * purity.areaPercent) / (100 + hidden) - (rule === 'guarded' ? (u ?? 0) : 0);
      if (result.state === 'pass' && hidden > 0 && least < limit) {
        const reason =
          `The integration leaves out up to ${hidden.toPrecision(2)} % in peaks under its own limits (disregard ` +
          `limit ${trace.minimumAreaPercent} %, S/N ${trace.minimumSignalToNoise}): enough to break this limit. Integrate with lower ones.`;
        return withExclusions({ ...result, state: 'inconclusive', reason }, trace, inputs);
      }
      return withExclusions({ ...result, reason: `${result.reason} ${said}` }, trace, inputs);
    });
    return [worstOf(results)];
  },
});
