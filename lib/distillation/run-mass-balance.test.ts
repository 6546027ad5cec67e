import { describe, expect, it } from 'vitest';
import { runMassBalance } from './run-mass-balance';

const run = { chargeMassG: 100, residueMassG: null, technique: 'fractional' };
const fraction = (cut: string, netMassG: number | null) => ({ cut, netMassG });

describe('the mass balance of a run', () => {
  it('adds all receivers and the residue, and tells the loss', () => {
    const balance = runMassBalance({ ...run, residueMassG: 8 }, [
      fraction('fore-run', 10),
      fraction('heart', 80),
    ]);
    expect(balance.recoveredMassG).toBeCloseTo(98, 9);
    expect(balance.lossMassG).toBeCloseTo(2, 9);
    expect(balance.flags).toEqual([]);
  });

  it('counts a residue once that is both noted with the run and weighed as a fraction', () => {
    const balance = runMassBalance({ ...run, residueMassG: 8 }, [
      fraction('heart', 80),
      fraction('residue', 8.1),
    ]);
    expect(balance.recoveredMassG).toBeCloseTo(88.1, 9);
  });

  it('asks for the trap only where there is one', () => {
    const flags = (technique: string) => runMassBalance({ ...run, technique }, [fraction('heart', 80)]).flags;
    expect(flags('simple')).toEqual(['no residue weighed']);
    expect(flags('reduced pressure')).toEqual(['no residue weighed', 'no trap weighed']);
  });

  it('says that a receiver is not weighed yet', () => {
    const balance = runMassBalance({ ...run, residueMassG: 1 }, [fraction('heart', null)]);
    expect(balance.flags).toEqual(['fractions without a mass']);
  });

  it('flags more than was put in beyond the uncertainty of the weighings', () => {
    // Two weighings of 0.01 g and the charge: u = sqrt(3) x 0.01 g (JCGM 100:2008, 5.1.2).
    const flags = (netMassG: number) =>
      runMassBalance({ ...run, residueMassG: 0 }, [fraction('heart', netMassG)]).flags;
    expect(flags(100.02)).toEqual([]);
    expect(flags(100.2)).toEqual(['recovery over 100 %']);
  });
});
