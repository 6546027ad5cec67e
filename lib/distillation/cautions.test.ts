import { describe, expect, it } from 'vitest';
import { DEFERENCE, listCautions, type Caution, type HazardousLiquid } from './cautions';

// Flash points and autoignition temperatures: IEC 60079-20-1. Peroxide classes: from memory of the published lists.
const toluene: HazardousLiquid = {
  name: 'toluene',
  flashPointC: 4,
  autoignitionC: 530,
  source: 'IEC 60079-20-1',
};
const ether: HazardousLiquid = {
  name: 'diethyl ether',
  peroxideClass: 'B',
  flashPointC: -45,
  autoignitionC: 175,
  source: 'IEC 60079-20-1',
};
const codes = (list: Caution[]): string[] => list.map((c) => c.code);

describe('cautions of a distillation', () => {
  it('refuse numbers that are none', () => {
    expect(() => listCautions({ liquids: [], pressureMbar: Number.NaN })).toThrow(RangeError);
    expect(() => listCautions({ liquids: [], pressureMbar: 0 })).toThrow(RangeError);
    expect(() =>
      listCautions({ liquids: [toluene], pressureMbar: 50, heatingTemperatureC: Number.NaN }),
    ).toThrow(RangeError);
    expect(() => listCautions({ liquids: [], pressureMbar: 50, residueShare: 10 })).toThrow(RangeError);
  });

  it('each defers to local rules and none gives leave', () => {
    const list = listCautions({
      liquids: [
        ether,
        { name: 'x', peroxideClass: 'A' },
        { name: 'y', peroxideClass: 'C', decompositionC: 100 },
      ],
      pressureMbar: 10,
      heatingTemperatureC: 200,
      residueShare: 0.02,
    });
    for (const c of list) {
      expect(c.text.endsWith(DEFERENCE)).toBe(true);
      expect(c.text).not.toMatch(/\b(is safe|may proceed|permitted|allowed)\b/i);
      expect(c.basis.length).toBeGreaterThan(5);
    }
    expect(codes(list)).toEqual(
      expect.arrayContaining(['peroxides', 'polymerisation', 'decomposition', 'implosion']),
    );
  });

  it('are never empty: an open system and a wet still are always asked for', () => {
    const list = listCautions({ liquids: [], pressureMbar: 1013 });
    expect(codes(list)).toEqual(['closed-system', 'dryness']);
  });

  it('put warnings first', () => {
    const severities = listCautions({ liquids: [ether], pressureMbar: 50, heatingTemperatureC: 60 }).map(
      (c) => c.severity,
    );
    expect(severities).toEqual([...severities].sort().reverse());
  });

  it.each(['A', 'B', 'C'] as const)(
    'warn of class %s: test before distilling, never to dryness',
    (peroxideClass) => {
      const list = listCautions({
        liquids: [{ ...toluene, name: 'a liquid', peroxideClass }],
        pressureMbar: 1013,
      });
      const found = list.find((c) => c.code === 'peroxides' || c.code === 'polymerisation')!;
      expect(found.severity).toBe('warning');
      expect(found.text).toMatch(/test for peroxides.*never distil to dryness/);
      expect(list.find((c) => c.code === 'dryness')!.severity).toBe('warning');
    },
  );

  it('warn at the autoignition temperature and caution from 80 % of it (EN 1127-1, from memory)', () => {
    const at = (heatingTemperatureC: number) =>
      codes(listCautions({ liquids: [ether], pressureMbar: 1013, heatingTemperatureC }));
    expect(at(175)).toContain('above-autoignition');
    expect(at(174)).toContain('near-autoignition');
    expect(at(140)).toContain('near-autoignition');
    expect(at(139)).not.toContain('near-autoignition');
  });

  it('caution above the flash point', () => {
    const at = (heatingTemperatureC: number) =>
      codes(listCautions({ liquids: [toluene], pressureMbar: 1013, heatingTemperatureC }));
    expect(at(3)).not.toContain('above-flash-point');
    expect(at(4)).toContain('above-flash-point');
  });

  it('warn of implosion under reduced pressure only', () => {
    expect(codes(listCautions({ liquids: [toluene], pressureMbar: 50 }))).toContain('implosion');
    expect(codes(listCautions({ liquids: [toluene], pressureMbar: 1000 }))).not.toContain('implosion');
  });

  it('warn near dryness', () => {
    const near = listCautions({ liquids: [toluene], pressureMbar: 1013, residueShare: 0.05 });
    expect(near.find((c) => c.code === 'dryness')).toMatchObject({ severity: 'warning' });
    const far = listCautions({ liquids: [toluene], pressureMbar: 1013, residueShare: 0.2 });
    expect(far.find((c) => c.code === 'dryness')).toMatchObject({ severity: 'caution' });
  });

  it('say when hazards are not recorded rather than keep still', () => {
    const list = listCautions({ liquids: [{ name: 'myrcene' }], pressureMbar: 50, heatingTemperatureC: 120 });
    expect(list.find((c) => c.code === 'hazards-not-recorded')!.text).toMatch(
      /flash point and no autoignition temperature.*myrcene/,
    );
    expect(codes(listCautions({ liquids: [toluene], pressureMbar: 50 }))).not.toContain(
      'hazards-not-recorded',
    );
  });
});
