import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { recorded } from '@/lib/audit/recorded';
import { closeDatabase, database } from '@/lib/database/connection';
import { Compound, CompoundSynonym, LiteratureValue } from '@/lib/database/records';
import { readReferenceCompounds, readReferenceLiteratureValues } from '@/seeders/reference/read-reference';
import { seedReference } from '@/seeders/seed-reference';
import { isSeeded, seeder, seedOnce } from '@/seeders/seed-step';
import { unique } from '../support/test-server';

afterAll(closeDatabase);
beforeAll(async () => void (await seedReference()));

async function count(sql: string, replacements: unknown[] = []): Promise<number> {
  const [row] = await database().query<{ n: number | string }>(sql, {
    replacements,
    type: QueryTypes.SELECT,
  });
  return Number(row?.n);
}

describe('the seeded reference table', () => {
  it('holds every compound of the table, with its structure and synonyms', async () => {
    const table = await readReferenceCompounds();
    expect(table).toHaveLength(207);
    const kept = await Compound.findAll({ where: { casNumber: table.map(({ cas }) => cas) } });
    expect(kept).toHaveLength(207);
    const acetone = kept.find(({ casNumber }) => casNumber === '67-64-1')!;
    expect(acetone).toMatchObject({ name: 'acetone', formula: 'C3H6O', smiles: 'CC(=O)C' });
    const synonyms = await CompoundSynonym.findAll({ where: { compoundId: acetone.id } });
    expect(synonyms.map(({ name }) => name)).toContain('dimethyl ketone');
  });

  it('has as many values as the table, each number bit for bit', async () => {
    const acetone = await Compound.findOne({ where: { casNumber: '67-64-1' } });
    const table = (await readReferenceLiteratureValues()).filter(({ cas }) => cas === '67-64-1');
    const kept = await LiteratureValue.findAll({ where: { compoundId: acetone!.id, addedById: null } });
    const facts = (row: { property: string; value: number | null; source: string }) =>
      JSON.stringify([row.property, row.value, row.source]);
    expect(kept.map(facts).sort()).toEqual(table.map(facts).sort());
  });

  it('has one preferred value for each property of a compound', async () => {
    const twice = await count(
      `SELECT COUNT(*) AS n FROM (SELECT compoundId, property FROM literature_values
        WHERE preferred AND replacedAt IS NULL GROUP BY compoundId, property HAVING COUNT(*) > 1) t`,
    );
    expect(twice).toBe(0);
    const none = await count(
      `SELECT COUNT(*) AS n FROM (SELECT compoundId, property FROM literature_values
        WHERE replacedAt IS NULL GROUP BY compoundId, property HAVING SUM(preferred) = 0) t`,
    );
    expect(none).toBe(0);
  });

  it('is laid down once, and by one process where two begin together', async () => {
    const before = await count('SELECT COUNT(*) AS n FROM literature_values');
    expect(await Promise.all([seedReference(), seedReference()])).toEqual([0, 0]);
    expect(await count('SELECT COUNT(*) AS n FROM literature_values')).toBe(before);
  });

  it('leaves a compound that was changed since as it is', async () => {
    const compound = await Compound.findOne({ where: { casNumber: '64-17-5' } });
    const peroxideClass = compound!.peroxideClass;
    await recorded(seeder, async ({ transaction, record }) => {
      await compound!.update({ peroxideClass: 'C' }, { transaction });
      record({ type: 'compound.changed', recordType: 'compound', recordId: compound!.id });
    });
    await seedReference();
    await compound!.reload();
    expect(compound!.peroxideClass).toBe('C');
    await recorded(seeder, async ({ transaction, record }) => {
      await compound!.update({ peroxideClass }, { transaction });
      record({ type: 'compound.changed', recordType: 'compound', recordId: compound!.id });
    });
  });
});

describe('a step of seeding', () => {
  it('leaves nothing when it is interrupted, and is done when it is run again', async () => {
    const step = unique('step');
    const name = unique('compound');
    const work = (interrupted: boolean) =>
      seedOnce(step, 'reference.laid_down', async ({ transaction }) => {
        await Compound.create({ id: crypto.randomUUID(), name }, { transaction });
        if (interrupted) throw new Error('the power went out');
        return { name };
      });
    await expect(work(true)).rejects.toThrow('power');
    expect(await isSeeded(step)).toBe(false);
    expect(await Compound.count({ where: { name } })).toBe(0);
    expect(await work(false)).toBe(true);
    expect(await work(false)).toBe(false);
    expect(await Compound.count({ where: { name } })).toBe(1);
  });
});
