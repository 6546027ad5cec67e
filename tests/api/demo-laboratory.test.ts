import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeDatabase, database } from '@/lib/database/connection';
import {
  Compound,
  EvidenceFile,
  Fraction,
  Group,
  LogReading,
  Membership,
  Plate,
  Run,
  Signature,
  TrayItem,
  User,
  Verdict,
} from '@/lib/database/records';
import { findVapourPressureData } from '@/lib/compounds/vapour-pressure-data';
import { boilingPointAtPressure } from '@/lib/distillation/boiling-point/boiling-point-at-pressure';
import { seedDemo } from '@/seeders/demo/seed-demo';
import demoAccounts from '@/seeders/demo-accounts.json';
import { seedReference } from '@/seeders/seed-reference';
import { withSeedLock } from '@/seeders/seed-lock';

afterAll(closeDatabase);

let runs: Run[];
let fractions: Fraction[];

beforeAll(async () => {
  await withSeedLock(async () => {
    await seedReference();
    await seedDemo();
  });
  runs = (await Run.findAll()).filter(({ chargeLot }) => chargeLot?.startsWith('DEMO-'));
  fractions = await Fraction.findAll({ where: { runId: runs.map(({ id }) => id) } });
}, 240_000);

async function fractionOf(lot: string, number: number): Promise<Fraction> {
  const run = runs.find(({ chargeLot }) => chargeLot === lot)!;
  return Fraction.findOne({ where: { runId: run.id, number }, rejectOnEmpty: true });
}

describe('the demo laboratory', () => {
  it('has two groups, a dozen runs and sixty fractions in every state', () => {
    expect(new Set(runs.map(({ groupId }) => groupId)).size).toBe(2);
    expect(runs).toHaveLength(12);
    expect(fractions).toHaveLength(60);
    const statuses = new Set(fractions.map(({ status }) => status));
    expect([...statuses].sort()).toEqual(['open', 'reopened', 'returned', 'signed off', 'submitted']);
    const verdicts = new Set(fractions.map(({ verdictState }) => verdictState));
    for (const state of ['pass', 'fail', 'blind', 'incomplete'] as const) expect(verdicts).toContain(state);
  });

  it('gives each demo account its one role in the first group, and the administrator none', async () => {
    for (const { email, role } of demoAccounts) {
      const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
      const memberships = await Membership.findAll({ where: { userId: user.id } });
      expect(user.isAdmin).toBe(role === 'admin');
      expect(memberships.map((membership) => membership.role)).toEqual(role === 'admin' ? [] : [role]);
    }
  });

  it('says everywhere that it is invented', async () => {
    for (const { note, chargeSource } of runs) expect(`${note} ${chargeSource}`).toMatch(/invented/i);
    const groups = await Group.findAll({ where: { id: runs.map(({ groupId }) => groupId) } });
    for (const { name } of groups) expect(name).toContain('invented');
    const files = await EvidenceFile.findAll({ where: { runId: runs.map(({ id }) => id) } });
    expect(files.length).toBeGreaterThan(40);
    for (const { fileName } of files) expect(fileName).toContain('invented');
    const plates = await Plate.findAll({ where: { runId: runs.map(({ id }) => id) } });
    for (const { note } of plates) expect(note).toContain('Invented');
  });

  it('holds one blind spot that coverage finds: water beside ethyl acetate under a flame ionisation detector', async () => {
    const fraction = await fractionOf('DEMO-06', 2);
    expect(fraction).toMatchObject({ status: 'submitted', verdictState: 'blind' });
    expect(fraction.purityPercent).toBeGreaterThan(99.5);
    const verdict = await Verdict.findByPk(fraction.verdictId!, { rejectOnEmpty: true });
    const rows = verdict.coverage as unknown as { compound: string; seen: boolean; advice: string | null }[];
    const water = rows.find(({ compound }) => compound === 'water');
    expect(water?.seen).toBe(false);
    expect(water?.advice).toContain('refractive index');
  });

  it('holds a heart cut that fails and was returned with a reason', async () => {
    expect(await fractionOf('DEMO-03', 3)).toMatchObject({
      cut: 'heart',
      status: 'returned',
      verdictState: 'fail',
    });
  });

  it('holds a signature that a later reading superseded, and one that the PI took back', async () => {
    for (const [lot, number] of [
      ['DEMO-02', 2],
      ['DEMO-04', 2],
    ] as const) {
      const fraction = await fractionOf(lot, number);
      expect(fraction.status).toBe('reopened');
      const [signature] = await Signature.findAll({ where: { fractionId: fraction.id } });
      expect(signature?.supersededAt).not.toBeNull();
    }
  });

  it('has no signature by who collected the fraction, and none on a verdict other than pass', async () => {
    const signatures = await Signature.findAll({ where: { fractionId: fractions.map(({ id }) => id) } });
    expect(signatures.length).toBeGreaterThanOrEqual(10);
    for (const { fractionId, signerId, verdictId } of signatures) {
      const fraction = fractions.find(({ id }) => id === fractionId)!;
      expect(signerId).not.toBe(fraction.collectedById);
      expect((await Verdict.findByPk(verdictId))?.state).toBe('pass');
    }
  });

  it('has head temperatures that rise over a run and lie near the boiling point of the heart at its pressure', async () => {
    for (const run of runs) {
      const own = fractions.filter(
        ({ runId, headTemperatureFromC }) => runId === run.id && headTemperatureFromC !== null,
      );
      const ends = own
        .sort((one, other) => one.number - other.number)
        .flatMap(({ headTemperatureFromC, headTemperatureToC }) => [headTemperatureFromC, headTemperatureToC])
        .filter((value) => value !== null);
      expect(ends).toEqual([...ends].sort((a, b) => a! - b!));
      const data = await findVapourPressureData(run.targetCompoundId);
      const expectedC = boilingPointAtPressure(data!, run.plannedPressureMbar!).boilingPointC;
      for (const { cut, headTemperatureFromC } of own.filter(({ cut }) => cut === 'heart'))
        expect(Math.abs(headTemperatureFromC! - expectedC), `${run.chargeLot} ${cut}`).toBeLessThan(2.5);
      expect(await LogReading.count({ where: { runId: run.id } })).toBeGreaterThan(20);
    }
  });

  it('has files in the tray that wait for a person', async () => {
    const waiting = await TrayItem.findAll({ where: { groupId: runs.map(({ groupId }) => groupId) } });
    expect(waiting.filter(({ filedAt }) => filedAt === null).length).toBeGreaterThanOrEqual(3);
  });

  it('is laid out once', async () => {
    const count = async () =>
      (
        await database().query<{ n: number }>(
          `SELECT (SELECT COUNT(*) FROM fractions) + (SELECT COUNT(*) FROM traces) + (SELECT COUNT(*) FROM signatures)
            + (SELECT COUNT(*) FROM evidence_files) + (SELECT COUNT(*) FROM log_readings) AS n`,
          { type: QueryTypes.SELECT },
        )
      )[0]?.n;
    const before = await count();
    expect(await seedDemo()).toBe(false);
    expect(await count()).toEqual(before);
  });

  it('measures compounds that the reference table has', async () => {
    const targets = await Compound.findAll({
      where: { id: runs.map(({ targetCompoundId }) => targetCompoundId) },
    });
    expect(targets.map(({ name }) => name).sort()).toEqual([
      '(R)-limonene',
      'benzaldehyde',
      'citral',
      'cyclohexanone',
      'ethyl acetate',
      'linalool',
    ]);
  });
});
