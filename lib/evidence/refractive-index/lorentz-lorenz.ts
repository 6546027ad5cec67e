import { requireNotNegative, requireWithin } from '@/lib/units/require-number';
import { requireIndex } from './correct-index';

/** Specific refraction (n^2 - 1)/(n^2 + 2), without unit. */
export function refraction(n: number): number {
  const square = requireIndex('Refractive index', n) ** 2;
  return (square - 1) / (square + 2);
}

/** d refraction / d n = 6 n/(n^2 + 2)^2. */
export function refractionSlope(n: number): number {
  return (6 * n) / (n * n + 2) ** 2;
}

/**
 * Refractive index of a binary mixture: refraction additive in volume fractions (Lorentz-Lorenz, ideal mixing).
 *
 * @param volumeFraction of the second liquid, 0 to 1
 */
export function mixtureIndex(nFirst: number, nSecond: number, volumeFraction: number): number {
  requireWithin('Volume fraction', volumeFraction, 0, 1);
  const r = (1 - volumeFraction) * refraction(nFirst) + volumeFraction * refraction(nSecond);
  return Math.sqrt((1 + 2 * r) / (1 - r));
}

export type FractionEstimate =
  | {
      ok: true;
      /** Volume fraction of the second liquid as computed; may lie outside 0..1 within its uncertainty. */
      volumeFraction: number;
      /** Standard uncertainty (k = 1) from the three indices. */
      uncertainty: number;
      note: string;
    }
  | { ok: false; problem: string };

/**
 * Volume fraction of the second liquid in a binary mixture from its refractive index, by Lorentz-Lorenz, with its
 * standard uncertainty by propagation (JCGM 100:2008, 5.1.2). A problem is returned where the two liquids have
 * one index within its uncertainty, or where no mixture of the two has the index measured.
 *
 * @param uMixture, uFirst, uSecond standard uncertainties of the indices (default 0.0001 each, common practice)
 */
export function volumeFractionFromIndex(input: {
  nMixture: number;
  nFirst: number;
  nSecond: number;
  uMixture?: number;
  uFirst?: number;
  uSecond?: number;
}): FractionEstimate {
  const { nMixture, nFirst, nSecond } = input;
  const uMixture = requireNotNegative('u(n) of the mixture', input.uMixture ?? 0.0001);
  const uFirst = requireNotNegative('u(n) of the first liquid', input.uFirst ?? 0.0001);
  const uSecond = requireNotNegative('u(n) of the second liquid', input.uSecond ?? 0.0001);
  const span = refraction(nSecond) - refraction(nFirst);
  if (Math.abs(nSecond - nFirst) <= 2 * Math.hypot(uFirst, uSecond) || span === 0) {
    return {
      ok: false,
      problem:
        'The two liquids have the same refractive index within its uncertainty: it cannot tell them apart. Use another test.',
    };
  }
  const volumeFraction = (refraction(nMixture) - refraction(nFirst)) / span;
  const uncertainty =
    Math.hypot(
      refractionSlope(nMixture) * uMixture,
      (1 - volumeFraction) * refractionSlope(nFirst) * uFirst,
      volumeFraction * refractionSlope(nSecond) * uSecond,
    ) / Math.abs(span);
  if (volumeFraction < -2 * uncertainty || volumeFraction > 1 + 2 * uncertainty) {
    return {
      ok: false,
      problem:
        'No mixture of these two liquids has this refractive index: something else is in it, or the reading is off.',
    };
  }
  return {
    ok: true,
    volumeFraction,
    uncertainty,
    note: 'Two liquids assumed, ideal mixing (Lorentz-Lorenz); volume change on mixing is not in the uncertainty.',
  };
}
