import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findPreferredLiterature } from '@/lib/compounds/find-literature';
import { findVapourPressureData, requireVapourPressureData } from '@/lib/compounds/vapour-pressure-data';
import { boilingPointAtPressure } from '@/lib/distillation/boiling-point/boiling-point-at-pressure';
import { Compound } from '@/lib/database/records';
import { seedReference } from '@/seeders/seed-reference';
import { buildCompound, buildGroup, buildUser } from '../factories/records';
import { type Agent, signedIn, stopTestServer } from '../support/test-server';

afterAll(stopTestServer);

let pi: Agent;
let analyst: Agent;

beforeAll(async () => {
  await seedReference();
  const group = await buildGroup();
  const people = [
    await buildUser({ group, roles: ['pi'] }),
    await buildUser({ group, roles: ['analyst'] }),
  ] as const;
  pi = await signedIn({ email: people[0].email, password: people[0].plainPassword });
  analyst = await signedIn({ email: people[1].email, password: people[1].plainPassword });
});

const index = {
  property: 'refractive index',
  value: 1.4727,
  temperatureC: 20,
  wavelengthNm: 589.3,
  source: 'invented for this test',
};

async function compoundWithIndex() {
  const compound = await buildCompound();
  const address = `/api/v1/compounds/${compound.id}/literature`;
  const { body } = await pi.post(address).send(index).expect(201);
  return { compound, address, first: body };
}

describe('literature values', () => {
  it('keep unit, conditions and source, and the first one is preferred', async () => {
    const { address, first } = await compoundWithIndex();
    expect(first).toMatchObject({ value: 1.4727, unit: '1', preferred: true, source: index.source });
    expect(first.conditions).toMatchObject({ temperatureC: 20, wavelengthNm: 589.3, pressureKPa: null });
    const { body } = await analyst.get(address).expect(200);
    expect(body.items).toEqual([first]);
  });

  it('stand beside one another, the second not preferred unless asked', async () => {
    const { compound, address, first } = await compoundWithIndex();
    const second = await pi
      .post(address)
      .send({ ...index, value: 1.4701, temperatureC: 25 })
      .expect(201);
    expect(second.body.preferred).toBe(false);
    const third = await pi
      .post(address)
      .send({ ...index, value: 1.4725, preferred: true })
      .expect(201);
    expect(third.body.preferred).toBe(true);
    expect((await findPreferredLiterature(compound.id, 'refractive index'))?.id).toBe(third.body.id);
    const { body } = await pi.get(address).query({ property: 'refractive index' }).expect(200);
    expect(body.items.find(({ id }: { id: string }) => id === first.id).preferred).toBe(false);
  });

  it('are corrected by a new value: the old one stays, marked, and the preference moves', async () => {
    const { compound, address, first } = await compoundWithIndex();
    await pi
      .post(address)
      .send({ ...index, value: 1.4728, corrects: first.id })
      .expect(422);
    const reason = 'misread from the table';
    const { body: corrected } = await pi
      .post(address)
      .send({ ...index, value: 1.4728, corrects: first.id, reason })
      .expect(201);
    expect(corrected).toMatchObject({ corrects: first.id, preferred: true, reason });
    const { body } = await pi.get(address).expect(200);
    const old = body.items.find(({ id }: { id: string }) => id === first.id);
    expect(old).toMatchObject({ value: 1.4727, preferred: false });
    expect(old.replacedAt).not.toBeNull();
    const inForce = await pi.get(address).query({ inForce: 'true' }).expect(200);
    expect(inForce.body.items.map(({ id }: { id: string }) => id)).toEqual([corrected.id]);
    expect((await findPreferredLiterature(compound.id, 'refractive index'))?.value).toBe(1.4728);
    await pi
      .post(address)
      .send({ ...index, corrects: first.id, reason })
      .expect(409);
  });

  it('take the preference from a value far away only with a reason', async () => {
    const { address, first } = await compoundWithIndex();
    const far = { ...index, value: 1.4827, preferred: true };
    const { body } = await pi.post(address).send(far).expect(422);
    expect(body.errors[0]).toMatchObject({ path: 'reason', message: expect.stringContaining('by 0.01') });
    const kept = await pi.get(address).expect(200);
    expect(kept.body.items).toEqual([first]);
    const given = await pi
      .post(address)
      .send({ ...far, reason: 'the older source was misprinted' })
      .expect(201);
    expect(given.body).toMatchObject({ preferred: true, reason: 'the older source was misprinted' });
  });

  it('are not corrected by another property, nor through another compound', async () => {
    const { address, first } = await compoundWithIndex();
    const other = await buildCompound();
    const correction = { ...index, corrects: first.id, reason: 'wrong compound' };
    await pi.post(`/api/v1/compounds/${other.id}/literature`).send(correction).expect(404);
    const density = { property: 'density', value: 0.84, temperatureC: 20, source: 'invented' };
    await pi
      .post(address)
      .send({ ...density, corrects: first.id, reason: 'x' })
      .expect(422);
  });

  it('keep exactly one preferred when two people correct at the same moment', async () => {
    const { compound, address, first } = await compoundWithIndex();
    const correction = { ...index, corrects: first.id, reason: 'at the same moment' };
    const answers = await Promise.all(
      [1.4721, 1.4722, 1.4723].map((value) => pi.post(address).send({ ...correction, value })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    const { body } = await pi.get(address).expect(200);
    expect(body.items.filter(({ preferred }: { preferred: boolean }) => preferred)).toHaveLength(1);
    expect(await findPreferredLiterature(compound.id, 'refractive index')).not.toBeNull();
  });

  it.each([
    ['a value without its temperature', { temperatureC: undefined }],
    ['a value that no liquid has', { value: 14.7 }],
    ['no value', { value: undefined }],
    ['no source', { source: '' }],
    ['another unit', { unit: 'mm' }],
    ['an unknown property', { property: 'colour' }],
    ['a temperature below absolute zero', { temperatureC: -300 }],
  ])('refuse %s', async (_what, change) => {
    const compound = await buildCompound();
    const { body } = await pi
      .post(`/api/v1/compounds/${compound.id}/literature`)
      .send({ ...index, ...change })
      .expect(422);
    expect(body.errors.length).toBeGreaterThan(0);
  });

  it('are written by a PI only', async () => {
    const { address, first } = await compoundWithIndex();
    const refused = await analyst.post(address).send(index).expect(403);
    expect(refused.body.detail).toContain('PI');
    await analyst
      .patch(`${address}/${first.id}`)
      .set('If-Match', '"0"')
      .send({ preferred: true, reason: 'x' })
      .expect(403);
    await pi.post(`/api/v1/compounds/${randomUUID()}/literature`).send(index).expect(404);
  });

  it('change the preference under the version that was read', async () => {
    const { compound, address } = await compoundWithIndex();
    const { body: second } = await pi
      .post(address)
      .send({ ...index, value: 1.4726 })
      .expect(201);
    const body = { preferred: true, reason: 'nearer to two other tables' };
    await pi.patch(`${address}/${second.id}`).send(body).expect(428);
    await pi.patch(`${address}/${second.id}`).set('If-Match', '"9"').send(body).expect(409);
    const { body: kept } = await pi
      .patch(`${address}/${second.id}`)
      .set('If-Match', '"0"')
      .send(body)
      .expect(200);
    expect(kept).toMatchObject({ preferred: true, version: 1 });
    expect((await findPreferredLiterature(compound.id, 'refractive index'))?.id).toBe(second.id);
  });
});

describe('vapour pressures from the literature', () => {
  async function boilsAtC(cas: string, pressureMbar: number) {
    const compound = await Compound.findOne({ where: { casNumber: cas } });
    return boilingPointAtPressure(await requireVapourPressureData(compound!.id), pressureMbar);
  }

  it('give water and toluene at reduced pressure as the steam table and the handbook do', async () => {
    // Water 45.8 °C at 100 mbar (IAPWS-95 saturation table, from memory); toluene 45.2 °C at 100 mbar
    // (CRC Handbook: 45.1 °C at 10 kPa, from memory).
    expect((await boilsAtC('7732-18-5', 100)).boilingPointC).toBeCloseTo(45.8, 0);
    expect(Math.abs((await boilsAtC('108-88-3', 100)).boilingPointC - 45.1)).toBeLessThan(0.5);
  });

  it('tell liquids that associate from those that do not', async () => {
    const associated = async (cas: string) => {
      const compound = await Compound.findOne({ where: { casNumber: cas } });
      return (await findVapourPressureData(compound!.id))?.associationClass ?? null;
    };
    expect(await associated('64-17-5')).toBe('alcohol');
    expect(await associated('64-19-7')).toBe('acid');
    expect(await associated('7732-18-5')).toBe('other');
    expect(await associated('141-78-6')).toBeNull();
  });

  it('are null without a normal boiling point, and say what to add where they are needed', async () => {
    const compound = await buildCompound();
    expect(await findVapourPressureData(compound.id)).toBeNull();
    await expect(requireVapourPressureData(compound.id)).rejects.toThrow(/Add one with its source/);
  });

  it('follow a correction of the boiling point', async () => {
    const compound = await buildCompound();
    const address = `/api/v1/compounds/${compound.id}/literature`;
    const value = { property: 'normal boiling point', value: 150, pressureKPa: 101.325, source: 'invented' };
    const { body } = await pi.post(address).send(value).expect(201);
    await pi
      .post(address)
      .send({ ...value, value: 155, corrects: body.id, reason: 'misprint' })
      .expect(201);
    expect((await findVapourPressureData(compound.id))?.normalBoilingPointC).toBe(155);
  });
});
