import { requireFinite, requireNotNegative } from '@/lib/units/require-number';

export type RfValue = { rf: number; rfUncertainty: number };

export type Agreement = {
  state: 'agree' | 'differ' | 'not judged';
  difference: number;
  /** 2 sqrt(u1^2 + u2^2), the largest difference that still agrees. */
  limit: number;
  reason: string;
};

/**
 * Whether two lanes show a spot at the same place: |dRf| <= 2 sqrt(u1^2 + u2^2) (JCGM 100:2008). Only spots of one
 * plate are judged (Ph. Eur. 2.2.27 and USP <203> compare on the same plate); across plates the difference is
 * shown with the state 'not judged'. Throws a RangeError for numbers that are none.
 */
export function compareRf(one: RfValue, other: RfValue, samePlate: boolean): Agreement {
  const difference = requireFinite('Rf', one.rf) - requireFinite('Rf', other.rf);
  const limit =
    2 *
    Math.hypot(
      requireNotNegative('u(Rf)', one.rfUncertainty),
      requireNotNegative('u(Rf)', other.rfUncertainty),
    );
  const shown = `ΔRf ${Math.abs(difference).toFixed(3)}, limit ${limit.toFixed(3)}`;
  if (!samePlate) {
    return {
      state: 'not judged',
      difference,
      limit,
      reason: `${shown}; the lanes are on different plates, run them side by side on one plate to compare.`,
    };
  }
  const agree = Math.abs(difference) <= limit + 1e-12;
  return {
    state: agree ? 'agree' : 'differ',
    difference,
    limit,
    reason: agree ? `${shown}: the same place within the uncertainty.` : `${shown}: different places.`,
  };
}
