import { requirePositive } from '@/lib/units/require-number';
import { requireIndex } from './correct-index';
import { refraction } from './lorentz-lorenz';

export type SmallestVisible =
  | { state: 'sees'; volumePercent: number; reason: string }
  | { state: 'blind'; volumePercent: null; reason: string };

/**
 * The smallest volume percentage of an impurity that moves the refractive index of the target by the tolerance,
 * by Lorentz-Lorenz. An impurity whose pure index lies within the tolerance of the target's is never seen.
 * Both indices at one temperature and wavelength. Throws a RangeError for a tolerance that is not above zero.
 */
export function smallestVisible(input: {
  nTarget: number;
  nImpurity: number;
  tolerance: number;
}): SmallestVisible {
  const target = requireIndex('Index of the target', input.nTarget);
  const impurity = requireIndex('Index of the impurity', input.nImpurity);
  const tolerance = requirePositive('Tolerance', input.tolerance);
  if (Math.abs(impurity - target) <= tolerance) {
    return {
      state: 'blind',
      volumePercent: null,
      reason: `Its index ${impurity.toFixed(4)} lies within ${tolerance.toFixed(4)} of the target's ${target.toFixed(4)}: no amount of it can be seen.`,
    };
  }
  const moved = target + Math.sign(impurity - target) * tolerance;
  const share = (refraction(moved) - refraction(target)) / (refraction(impurity) - refraction(target));
  return {
    state: 'sees',
    volumePercent: 100 * share,
    reason: `${(100 * share).toPrecision(2)} vol % of index ${impurity.toFixed(4)} moves ${target.toFixed(4)} by ${tolerance.toFixed(4)} (Lorentz-Lorenz).`,
  };
}
