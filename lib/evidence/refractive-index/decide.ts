import { requireFinite, requireNotNegative, requirePositive } from '@/lib/units/require-number';

export type DecisionRule = 'guarded' | 'simple';
export type Decision = { state: 'pass' | 'fail' | 'inconclusive'; reason: string };

/** Absorbs the binary rounding of four-decimal numbers, nothing more. */
const ROUNDING = 1e-9;

/**
 * Decides on a difference from the literature within a tolerance (JCGM 106:2012, 8.2 and 8.3).
 * Guarded: pass when |d| + U <= tol, fail when |d| - U > tol, between them inconclusive.
 * Simple: pass when |d| <= tol, else fail, whatever U is; a U larger than the tolerance is warned of.
 *
 * @throws RangeError for a tolerance that is not above zero, a negative U, or a difference that is no number
 */
export function decideDifference(input: {
  difference: number;
  expandedUncertainty: number;
  tolerance: number;
  rule: DecisionRule;
}): Decision {
  const d = Math.abs(requireFinite('Difference', input.difference));
  const u = requireNotNegative('Expanded uncertainty', input.expandedUncertainty);
  const tolerance = requirePositive('Tolerance', input.tolerance);
  const numbers = `|d| ${d.toFixed(5)}, U ${u.toFixed(5)}, tolerance ${tolerance.toFixed(5)}`;
  if (input.rule === 'simple') {
    const inside = d <= tolerance + ROUNDING;
    const warning =
      u > tolerance + ROUNDING
        ? " The uncertainty is larger than the tolerance: read more often and nearer the literature's temperature."
        : '';
    return {
      state: inside ? 'pass' : 'fail',
      reason: `${numbers}: ${inside ? 'within' : 'outside'} (simple acceptance).${warning}`,
    };
  }
  if (d + u <= tolerance + ROUNDING)
    return { state: 'pass', reason: `${numbers}: within, with its uncertainty.` };
  if (d - u > tolerance + ROUNDING)
    return { state: 'fail', reason: `${numbers}: outside, even with its uncertainty.` };
  return {
    state: 'inconclusive',
    reason: `${numbers}: the uncertainty reaches over the limit. Read more often, or nearer the literature's temperature.`,
  };
}
