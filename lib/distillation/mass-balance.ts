import { requireFinite, requireNotNegative, requirePositive } from '@/lib/units/require-number';

/** Standard uncertainty of one weighing on a bench balance of two decimals, g (common practice). */
export const DEFAULT_WEIGHING_UNCERTAINTY_G = 0.01;

export type WeighedMass = { netMassG: number; netUncertaintyG: number };
export type NetMass = ({ ok: true } & WeighedMass) | { ok: false; problem: string };

/**
 * Net = gross - tare, with u = sqrt(2) u(weighing) (JCGM 100:2008, 5.1.2). Gross below tare is a problem for the
 * user to put right, not a negative mass. Throws a RangeError for numbers that are none or negative.
 */
export function netMass(input: {
  tareMassG: number;
  grossMassG: number;
  weighingUncertaintyG?: number;
}): NetMass {
  const tare = requireNotNegative('Tare (g)', input.tareMassG);
  const gross = requireNotNegative('Gross (g)', input.grossMassG);
  const u = requireNotNegative(
    'Uncertainty of a weighing (g)',
    input.weighingUncertaintyG ?? DEFAULT_WEIGHING_UNCERTAINTY_G,
  );
  const netUncertaintyG = Math.SQRT2 * u;
  const netMassG = gross - tare;
  if (netMassG < -2 * netUncertaintyG) {
    return { ok: false, problem: 'The gross mass is below the tare: check that the two are not swapped.' };
  }
  return { ok: true, netMassG: Math.max(0, netMassG), netUncertaintyG };
}

export type MassBalanceFlag =
  'recovery over 100 %' | 'no residue weighed' | 'no trap weighed' | 'fractions without a mass';

export type MassBalance = {
  recoveredMassG: number;
  /** Recovered mass over the charge, 1 for all of it. */
  recovery: number;
  /** Standard uncertainty (k = 1) of the recovery. */
  recoveryUncertainty: number;
  /** Charge less what was recovered; below zero when more was weighed than put in. */
  lossMassG: number;
  lossPercent: number;
  flags: MassBalanceFlag[];
};

/**
 * Mass balance of a run: fractions, residue and trap over the charge, with uncertainty by propagation
 * (JCGM 100:2008, 5.1.2). A recovery over 100 % by more than its expanded uncertainty (k = 2) is flagged. A mass
 * that was not weighed (null) is flagged and counts as nothing: the loss then holds it.
 *
 * @throws RangeError for a charge that is not above zero, or for masses that are negative or no numbers
 */
export function massBalance(input: {
  chargeMassG: number;
  chargeUncertaintyG?: number;
  fractions: readonly (WeighedMass | null)[];
  residue: WeighedMass | null;
  /** undefined when the technique has no trap. */
  trap?: WeighedMass | null;
}): MassBalance {
  const charge = requirePositive('Charge (g)', input.chargeMassG);
  const uCharge = requireNotNegative(
    'Uncertainty of the charge (g)',
    input.chargeUncertaintyG ?? DEFAULT_WEIGHING_UNCERTAINTY_G,
  );
  const weighed = [...input.fractions, input.residue, input.trap ?? null].filter((m) => m !== null);
  weighed.forEach((m) => {
    requireNotNegative('Net mass (g)', m.netMassG);
    requireNotNegative('Uncertainty of a net mass (g)', m.netUncertaintyG);
  });
  const recoveredMassG = weighed.reduce((sum, m) => sum + m.netMassG, 0);
  const recovery = recoveredMassG / charge;
  const uRecovered = Math.hypot(0, ...weighed.map((m) => m.netUncertaintyG));
  const recoveryUncertainty = Math.hypot(uRecovered, recovery * uCharge) / charge;
  const flags: MassBalanceFlag[] = [];
  if (recovery > 1 + 2 * recoveryUncertainty) flags.push('recovery over 100 %');
  if (input.residue === null) flags.push('no residue weighed');
  if (input.trap === null) flags.push('no trap weighed');
  if (input.fractions.includes(null)) flags.push('fractions without a mass');
  const lossMassG = charge - recoveredMassG;
  return {
    recoveredMassG,
    recovery,
    recoveryUncertainty,
    lossMassG,
    lossPercent: (100 * lossMassG) / charge,
    flags,
  };
}

/** One cut that may go into a pool. Purity as a fraction of one, with its standard uncertainty. */
export type PoolPart = { massG: number; purity: number; purityUncertainty: number };

/**
 * Purity that a pool would have, before anyone mixes anything: purities weighted by mass, u by propagation with
 * the masses taken as exact beside the purities.
 *
 * @throws RangeError for an empty pool, a mass that is not above zero, or a purity outside 0 to 1
 */
export function poolPurity(parts: readonly PoolPart[]): {
  massG: number;
  purity: number;
  purityUncertainty: number;
} {
  if (parts.length === 0) throw new RangeError('Choose at least one fraction to pool.');
  for (const part of parts) {
    requirePositive('Mass of a part (g)', part.massG);
    if (!(requireFinite('Purity', part.purity) >= 0 && part.purity <= 1)) {
      throw new RangeError(`A purity must lie between 0 and 1, got ${part.purity}.`);
    }
    requireNotNegative('Uncertainty of a purity', part.purityUncertainty);
  }
  const massG = parts.reduce((sum, p) => sum + p.massG, 0);
  return {
    massG,
    purity: parts.reduce((sum, p) => sum + p.massG * p.purity, 0) / massG,
    purityUncertainty: Math.hypot(...parts.map((p) => p.massG * p.purityUncertainty)) / massG,
  };
}
