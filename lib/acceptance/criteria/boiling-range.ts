import { z } from 'zod';
import { judgeFractionBoilingRange } from '../fraction-boiling-range';
import { criterion } from './kind';

export const boilingRange = criterion({
  name: 'Boiling range',
  schema: z.strictObject({
    toleranceC: z.number().gt(0).max(50).describe('allowed distance from the expected boiling point, °C'),
    maximumWidthC: z.number().gt(0).max(50).optional().describe('allowed width of the cut, °C'),
  }),
  evaluate(inputs, limit) {
    const width = limit.maximumWidthC === undefined ? '' : `, at most ${limit.maximumWidthC} °C wide`;
    const base = {
      name: 'Boiling range',
      limit: `within ${limit.toleranceC} °C of the expected boiling point${width}`,
      source: 'head temperatures at the recorded pressure',
    };
    const judged = judgeFractionBoilingRange(inputs.head, inputs.target, limit);
    if (judged.state === 'missing')
      return [{ ...base, state: 'missing', measured: null, uncertainty: null, reason: judged.reason }];
    const { result, expected } = judged;
    return [
      {
        ...base,
        state: result.state,
        measured: `${result.lowC.toFixed(1)} to ${result.highC.toFixed(1)} °C`,
        uncertainty: `± ${result.uncertaintyC.toFixed(1)} °C`,
        reason: [result.reason, ...result.notes].join(' '),
        source: `expected ${expected.boilingPointC.toFixed(1)} °C: ${expected.source}`,
      },
    ];
  },
});
