import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { massBalance, netMass, poolPurity } from './mass-balance';

const part = (netMassG: number, netUncertaintyG = 0.014) => ({ netMassG, netUncertaintyG });

describe('net mass', () => {
  it('refuses negative masses and numbers that are none, and says when tare and gross are swapped', () => {
    expect(() => netMass({ tareMassG: -1, grossMassG: 2 })).toThrow(RangeError);
    expect(() => netMass({ tareMassG: 1, grossMassG: Number.NaN })).toThrow(RangeError);
    const swapped = netMass({ tareMassG: 52.5, grossMassG: 40.25 });
    expect(swapped.ok).toBe(false);
    if (!swapped.ok) expect(swapped.problem).toMatch(/swapped/);
  });

  it('is gross less tare, u by propagation (JCGM 100:2008, 5.1.2)', () => {
    const net = netMass({ tareMassG: 40.25, grossMassG: 52.5 });
    expect(net.ok && net.netMassG).toBeCloseTo(12.25, 9);
    expect(net.ok && net.netUncertaintyG).toBeCloseTo(0.014142, 6);
  });

  it('of an empty receiver is zero even when the last digit wavers', () => {
    expect(netMass({ tareMassG: 40.25, grossMassG: 40.24 })).toMatchObject({ ok: true, netMassG: 0 });
  });
});

describe('mass balance', () => {
  it('refuses a charge of zero and negative masses', () => {
    expect(() => massBalance({ chargeMassG: 0, fractions: [], residue: null })).toThrow(RangeError);
    expect(() => massBalance({ chargeMassG: 100, fractions: [part(-1)], residue: null })).toThrow(RangeError);
    expect(() => massBalance({ chargeMassG: 100, fractions: [part(Number.NaN)], residue: null })).toThrow(
      RangeError,
    );
  });

  it('sums fractions, residue and trap over the charge and shows the loss (arithmetic)', () => {
    const balance = massBalance({
      chargeMassG: 100,
      fractions: [part(5), part(70)],
      residue: part(15),
      trap: part(4),
    });
    expect(balance.recoveredMassG).toBeCloseTo(94, 9);
    expect(balance.recovery).toBeCloseTo(0.94, 9);
    expect(balance.lossMassG).toBeCloseTo(6, 9);
    expect(balance.lossPercent).toBeCloseTo(6, 9);
    expect(balance.flags).toEqual([]);
    // sqrt(4 * 0.014^2 + (0.94 * 0.01)^2)/100
    expect(balance.recoveryUncertainty).toBeCloseTo(Math.sqrt(4 * 0.014 ** 2 + 0.0094 ** 2) / 100, 9);
  });

  it('flags more than was put in only beyond its uncertainty', () => {
    const at = (g: number) => massBalance({ chargeMassG: 100, fractions: [part(g)], residue: part(0) }).flags;
    expect(at(100.02)).toEqual([]);
    expect(at(100.5)).toEqual(['recovery over 100 %']);
  });

  it('flags what was not weighed, and does not ask for a trap that the technique has not', () => {
    expect(
      massBalance({ chargeMassG: 100, fractions: [null, part(10)], residue: null, trap: null }).flags,
    ).toEqual(['no residue weighed', 'no trap weighed', 'fractions without a mass']);
    expect(massBalance({ chargeMassG: 100, fractions: [], residue: part(1) }).flags).toEqual([]);
  });
});

describe('pooling', () => {
  it('refuses an empty pool, no mass, and a purity in per cent', () => {
    expect(() => poolPurity([])).toThrow(RangeError);
    expect(() => poolPurity([{ massG: 0, purity: 0.9, purityUncertainty: 0.01 }])).toThrow(RangeError);
    expect(() => poolPurity([{ massG: 1, purity: 98, purityUncertainty: 0.01 }])).toThrow(RangeError);
    expect(() => poolPurity([{ massG: 1, purity: 0.9, purityUncertainty: -0.01 }])).toThrow(RangeError);
  });

  it('weighs purities by mass (arithmetic): 30 g of 0.99 and 10 g of 0.95 make 0.98', () => {
    const pool = poolPurity([
      { massG: 30, purity: 0.99, purityUncertainty: 0.002 },
      { massG: 10, purity: 0.95, purityUncertainty: 0.004 },
    ]);
    expect(pool.massG).toBe(40);
    expect(pool.purity).toBeCloseTo(0.98, 9);
    expect(pool.purityUncertainty).toBeCloseTo(Math.sqrt(0.06 ** 2 + 0.04 ** 2) / 40, 9);
  });

  it('never leaves the span of its parts', () => {
    const parts = fc.array(
      fc.record({
        massG: fc.double({ min: 0.01, max: 1000, noNaN: true }),
        purity: fc.double({ min: 0, max: 1, noNaN: true }),
        purityUncertainty: fc.constant(0.01),
      }),
      { minLength: 1, maxLength: 12 },
    );
    fc.assert(
      fc.property(parts, (list) => {
        const { purity } = poolPurity(list);
        expect(purity).toBeGreaterThanOrEqual(Math.min(...list.map((p) => p.purity)) - 1e-12);
        expect(purity).toBeLessThanOrEqual(Math.max(...list.map((p) => p.purity)) + 1e-12);
      }),
    );
  });
});
