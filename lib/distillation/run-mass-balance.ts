import {
  DEFAULT_WEIGHING_UNCERTAINTY_G,
  massBalance,
  type MassBalance,
  type WeighedMass,
} from './mass-balance';
import { hasColdTrap } from './techniques';

type RunMasses = { chargeMassG: number; residueMassG: number | null; technique: string };
type FractionMass = { cut: string; netMassG: number | null };

const weighed = (netMassG: number | null, weighings: number): WeighedMass | null =>
  netMassG === null
    ? null
    : { netMassG, netUncertaintyG: Math.sqrt(weighings) * DEFAULT_WEIGHING_UNCERTAINTY_G };

/**
 * The mass balance of a run from its records. The residue is the one weighed as a fraction, else the mass
 * noted with the run: counted once. A trap is asked for only where the technique has one or one was filed.
 */
export function runMassBalance(run: RunMasses, fractions: readonly FractionMass[]): MassBalance {
  const net = (fraction: FractionMass) => weighed(fraction.netMassG, 2);
  const ofCut = (cut: string) => fractions.filter((fraction) => fraction.cut === cut).map(net);
  const residues = ofCut('residue');
  const traps = ofCut('trap');
  const distillate = fractions.filter(({ cut }) => cut !== 'residue' && cut !== 'trap').map(net);
  const residue = residues.some((mass) => mass !== null) ? residues : [weighed(run.residueMassG, 1)];
  const [firstResidue = null, ...moreResidue] = residue;
  const [firstTrap, ...moreTraps] = traps;
  const none = hasColdTrap(run.technique) ? null : undefined;
  return massBalance({
    chargeMassG: run.chargeMassG,
    fractions: [...distillate, ...moreResidue, ...moreTraps],
    residue: firstResidue,
    trap: firstTrap === undefined ? none : firstTrap,
  });
}
