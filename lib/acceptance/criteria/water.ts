import { z } from 'zod';
import { areaPercentUncertainty, showAreaUncertainty } from '../area-uncertainty';
import { detectorSight } from '../coverage/detector';
import type { CriterionResult } from '../judge-inputs';
import { AREA_SOURCE, integratedTraces, worstOf } from './gc-main-peak';
import { withExclusions } from './integration-choices';
import { criterion, decideLimit } from './kind';

export const water = criterion({
  name: 'Water',
  schema: z.number().gt(0).max(100).describe('most water, area % by a detector that sees it'),
  evaluate(inputs, limit, rule) {
    const base = { name: 'Water', limit: `at most ${limit} %`, measured: null, uncertainty: null };
    const traces = integratedTraces(inputs.traces);
    if (traces.length === 0) {
      const reason =
        'Nothing that measures water is there. Add a gas chromatogram by thermal conductivity (TCD) or mass spectrometry.';
      return [{ ...base, source: 'no record', state: 'missing', reason }];
    }
    const seeing = traces.filter((trace) => detectorSight(trace.detector, inputs.water).sees);
    if (seeing.length === 0) {
      const [first] = traces;
      const reason = `${detectorSight(first?.detector ?? '', inputs.water).reason} Use a TCD or a mass spectrometer.`;
      return [{ ...base, source: 'detector of the trace', state: 'blind', reason }];
    }
    return [
      worstOf(
        seeing.map((trace): CriterionResult => {
          const peaks = trace.peaks.filter((peak) => peak.compoundId === inputs.water.id);
          if (peaks.length === 0) {
            const reason = `No peak of the ${trace.detector} trace is assigned to water. Assign it, or run a reference to show where it would be.`;
            return { ...base, source: AREA_SOURCE, state: 'inconclusive', reason };
          }
          const measured = peaks.reduce((sum, peak) => sum + peak.areaPercent, 0);
          const u = areaPercentUncertainty(
            trace.peaks,
            peaks.map((peak) => peak.number),
          );
          const result = decideLimit({
            facts: {
              ...base,
              source: AREA_SOURCE,
              measured: `${measured.toFixed(2)} %`,
              uncertainty: showAreaUncertainty(u),
            },
            measured,
            uncertainty: u,
            limit,
            side: 'at most',
            rule,
            remedy: 'Inject more, or improve signal-to-noise.',
          });
          return withExclusions(result, trace, inputs);
        }),
      ),
    ];
  },
});
