import {
  type BoilingPointResult,
  boilingPointAtPressure,
} from '@/lib/distillation/boiling-point/boiling-point-at-pressure';
import { type BoilingRangeResult, judgeBoilingRange } from '@/lib/distillation/boiling-range';
import type { CompoundFacts, JudgeInputs } from './judge-inputs';

export type JudgedBoilingRange =
  | { state: 'missing'; reason: string }
  | { state: 'judged'; expected: BoilingPointResult; result: BoilingRangeResult };

/** A tolerance to look with where no specification names one, °C (common practice). */
export const USUAL_BOILING_TOLERANCE_C = 2;

/**
 * The head temperatures of a fraction against the boiling point of its target at the recorded pressure
 * (Wagner, Antoine or Maxwell-Bonnell with its error). Missing values are named.
 */
export function judgeFractionBoilingRange(
  head: JudgeInputs['head'],
  target: CompoundFacts,
  limit: { toleranceC: number; maximumWidthC?: number },
): JudgedBoilingRange {
  if (head.fromC === null || head.toC === null)
    return { state: 'missing', reason: 'Head temperatures from and to are not recorded. Enter both.' };
  if (head.pressureMbar === null)
    return {
      state: 'missing',
      reason: 'The pressure is not recorded. Without it no boiling point can be expected.',
    };
  if (!target.vapourPressure) {
    const reason = `No literature value of the boiling point of ${target.name}. A PI can add one to the compound.`;
    return { state: 'missing', reason };
  }
  try {
    const expected = boilingPointAtPressure(target.vapourPressure, head.pressureMbar);
    const result = judgeBoilingRange({
      headTemperatureFromC: head.fromC,
      headTemperatureToC: head.toC,
      pressureMbar: head.pressureMbar,
      expected,
      ...limit,
    });
    return { state: 'judged', expected, result };
  } catch (error) {
    if (error instanceof RangeError)
      return { state: 'missing', reason: `The boiling range cannot be judged: ${error.message}` };
    throw error;
  }
}
