import { describe, expect, it } from 'vitest';
import type { RunJson } from '@/lib/distillation/schema';
import { changedRunFacts, readRunEdit, runEditOf } from './run-edit-state';

const opened: RunJson = {
  id: 'r',
  code: 'D-2026-0001',
  version: 3,
  group: { id: 'g', name: 'A group' },
  chemist: { id: 'c', name: 'A chemist' },
  targetCompound: { id: 'limonene', name: 'limonene', cas: '5989-27-5' },
  knownImpurities: [
    { id: 'a-pinene', name: 'alpha-pinene', cas: null },
    { id: 'b-pinene', name: 'beta-pinene', cas: null },
  ],
  technique: 'vacuum',
  chargeMassG: 250,
  chargeSource: 'a bottle (invented)',
  chargeLot: null,
  columnStages: null,
  bath: null,
  bathTemperatureC: null,
  plannedPressureMbar: 66.661193707,
  safetyChecks: { pathOpen: true },
  residueMassG: null,
  note: null,
  startedAt: '2026-12-01T08:00:00.000Z',
  endedAt: null,
};
const read = (change: object, signedOff = false, unit: 'mbar' | 'mmHg' = 'mmHg') =>
  readRunEdit({ ...runEditOf(opened, unit), ...change }, unit, opened, signedOff);

describe('an edited run', () => {
  it('sends nothing that was not touched, also a pressure shown in another unit', () => {
    expect(read({})).toMatchObject({ body: {}, changed: false, fine: true });
    expect(read({}, false, 'mbar').changed).toBe(false);
  });

  it('sends only what was changed', () => {
    const { body } = read({ residueMass: '12.5 g', plannedPressure: '20', chargeLot: 'L-7' });
    expect(body.residueMassG).toBe(12.5);
    // 20 mmHg of 133.322387415 Pa each (NIST SP 811, appendix B).
    expect(body.plannedPressureMbar).toBeCloseTo(26.664477483, 9);
    expect(Object.keys(body).sort()).toEqual(['chargeLot', 'plannedPressureMbar', 'residueMassG']);
  });

  it('does not take another order, or a box ticked and unticked, for a change', () => {
    const impurities = [...runEditOf(opened, 'mbar').impurities].reverse();
    expect(read({ impurities, safetyChecks: { pathOpen: true, coolingRuns: false } }).changed).toBe(false);
  });

  it('asks for a reason where other known impurities end a signature', () => {
    const impurities = runEditOf(opened, 'mbar').impurities.slice(1);
    expect(read({ impurities }, true).problems.reason).toMatch(/Say why/);
    expect(read({ impurities, reason: ' not in this batch ' }, true)).toMatchObject({
      fine: true,
      body: { knownImpurities: ['b-pinene'], reason: 'not in this batch' },
    });
    expect(read({ impurities }, false).fine).toBe(true);
    expect(read({ note: 'bumped once' }, true).fine).toBe(true);
  });

  it('marks what cannot be empty or read', () => {
    expect(read({ chargeMass: '', residueMass: 'some' }).problems).toMatchObject({
      chargeMassG: expect.any(String),
      residueMassG: expect.any(String),
    });
  });
});

describe('what somebody else changed', () => {
  it('is named by fact', () => {
    const newer = { ...opened, version: 4, residueMassG: 11, knownImpurities: [], endedAt: opened.startedAt };
    expect(changedRunFacts(opened, newer).sort()).toEqual(['knownImpurities', 'residueMassG']);
  });
});
