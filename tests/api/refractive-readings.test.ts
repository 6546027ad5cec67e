import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Fraction, type Group } from '@/lib/database/records';
import { addImpurity, buildIndexedCompound, buildSpecification } from '../factories/literature';
import {
  buildCompound,
  buildFraction,
  buildGroup,
  buildRun,
  buildToken,
  buildUser,
  type BuiltUser,
} from '../factories/records';
import { type Agent, signedIn, stopTestServer, withToken } from '../support/test-server';

// Ethyl acetate 1.3723, cyclohexane 1.4262, heptane 1.3878 at 20 °C: CRC Handbook of Chemistry and Physics.
const crc = 'CRC Handbook of Chemistry and Physics';
let group: Group;
let user: BuiltUser;
let chemist: Agent;
let target: Awaited<ReturnType<typeof buildIndexedCompound>>;

const sessionOf = (one: BuiltUser) => signedIn({ email: one.email, password: one.plainPassword });
const pathOf = (fraction: Fraction) => `/api/v1/fractions/${fraction.code}/refractive-readings`;
async function freshFraction(compound = target) {
  return buildFraction({ run: await buildRun({ group, chemist: user, target: compound }) });
}

beforeAll(async () => {
  group = await buildGroup();
  user = await buildUser({ group, roles: ['chemist'] });
  chemist = await sessionOf(user);
  target = await buildIndexedCompound(1.3723, crc);
});
afterAll(stopTestServer);

describe('entering refractometer readings', () => {
  it('corrects the mean to the temperature of the literature value and decides', async () => {
    const fraction = await freshFraction();
    const { body } = await chemist
      .post(pathOf(fraction))
      .send({
        readings: [1.3689, 1.369, 1.3691],
        temperatureC: 27.3,
        waterReading: 1.3325,
        waterTemperatureC: 25,
        instrument: 'refractometer 2',
      })
      .expect(201);
    // 1.3690 at 27.3 °C is 1.3723 at 20 °C, 4.5e-4 per °C (common practice for organic liquids).
    expect(body.meanN).toBeCloseTo(1.369, 8);
    expect(body.correctedN).toBeCloseTo(1.3723, 4);
    expect(body).toMatchObject({
      atTemperatureC: 20,
      literature: { n: 1.3723, temperatureC: 20, source: crc },
      tolerance: 0.0005,
      decisionRule: 'simple',
      waterCheck: { state: 'good' },
      instrument: 'refractometer 2',
      methodVersion: 'refractive-index-1',
    });
    expect(body.toleranceSource).toMatch(/no specification/);
    expect(body.difference).toBeCloseTo(body.correctedN - 1.3723, 12);
    // U is twice the root of the sum of the squares of the budget (JCGM 100:2008, 5.1.2).
    const sum = body.budget.reduce(
      (total: number, row: { standardUncertainty: number }) => total + row.standardUncertainty ** 2,
      0,
    );
    expect(body.expandedUncertainty).toBeCloseTo(2 * Math.sqrt(sum), 12);
    const { body: list } = await chemist.get(pathOf(fraction)).expect(200);
    expect(list.items).toEqual([body]);
  });

  it('passes near the literature and fails far from it, at the very temperature', async () => {
    const good = await freshFraction();
    const { body } = await chemist
      .post(pathOf(good))
      .send({ readings: [1.3722, 1.3723, 1.3723], temperatureC: 20 });
    expect(body.state).toBe('pass');
    const bad = await freshFraction();
    const answer = await chemist
      .post(pathOf(bad))
      .send({ readings: [1.376, 1.3761, 1.376], temperatureC: 20 });
    expect(answer.body.state).toBe('fail');
  });

  it('is inconclusive when water reads more than 0.0005 off (Ph. Eur. 2.2.6), and keeps the readings', async () => {
    const given = { readings: [1.3723], temperatureC: 20, waterReading: 1.3337, waterTemperatureC: 20 };
    const { body } = await chemist
      .post(pathOf(await freshFraction()))
      .send(given)
      .expect(201);
    expect(body).toMatchObject({ state: 'inconclusive', waterCheck: { state: 'inconclusive' } });
    expect(body.reason).toMatch(/Clean and adjust/);
  });

  it('is inconclusive for another light than the sodium D line', async () => {
    const given = { readings: [1.3723], temperatureC: 20, wavelengthNm: 546.1 };
    const { body } = await chemist
      .post(pathOf(await freshFraction()))
      .send(given)
      .expect(201);
    expect(body.state).toBe('inconclusive');
    expect(body.reason).toMatch(/589.3 nm/);
  });

  it('is kept as inconclusive without a literature value, and says what to add', async () => {
    const fraction = await freshFraction(await buildCompound());
    const { body } = await chemist
      .post(pathOf(fraction))
      .send({ readings: [1.45], temperatureC: 22 })
      .expect(201);
    expect(body).toMatchObject({ state: 'inconclusive', correctedN: null, literature: null, meanN: 1.45 });
    expect(body.reason).toMatch(/PI can add one/);
  });

  it('says the smallest amount of each known impurity that it could see', async () => {
    const heptane = await buildIndexedCompound(1.3878, crc);
    const cyclohexane = await buildIndexedCompound(1.4262, crc);
    const twin = await buildIndexedCompound(1.388, 'a twin for this test (invented)');
    const unknown = await buildCompound();
    const run = await buildRun({ group, chemist: user, target: heptane });
    for (const impurity of [cyclohexane, twin, unknown]) await addImpurity(run.id, impurity.id);
    const fraction = await buildFraction({ run });
    const { body } = await chemist
      .post(pathOf(fraction))
      .send({ readings: [1.3878], temperatureC: 20 })
      .expect(201);
    const of = (id: string) =>
      body.smallestVisible.find((one: { compound: { id: string } }) => one.compound.id === id);
    // Cyclohexane in heptane, tolerance 0.0005: 1.3 vol % by Lorentz-Lorenz.
    expect(of(cyclohexane.id)).toMatchObject({ state: 'sees' });
    expect(of(cyclohexane.id).volumePercent).toBeCloseTo(1.3, 1);
    expect(of(twin.id)).toMatchObject({ state: 'blind', volumePercent: null });
    expect(of(unknown.id)).toMatchObject({ state: 'unknown', volumePercent: null });
  });

  it("takes tolerance and decision rule from the group's approved specification", async () => {
    const compound = await buildIndexedCompound(1.3723, crc);
    await buildSpecification({
      groupId: group.id,
      compoundId: compound.id,
      writtenById: user.id,
      criteria: { refractiveIndexTolerance: 0.002 },
    });
    const given = { readings: [1.3735, 1.3735, 1.3735], temperatureC: 20 };
    const { body } = await chemist
      .post(pathOf(await freshFraction(compound)))
      .send(given)
      .expect(201);
    expect(body).toMatchObject({ tolerance: 0.002, decisionRule: 'guarded', state: 'pass' });
    expect(body.toleranceSource).toMatch(/test grade, edition 1/);
  });

  it('has the fraction judged anew, and its version moves on', async () => {
    const fraction = await freshFraction();
    await chemist
      .post(pathOf(fraction))
      .send({ readings: [1.3723], temperatureC: 20 })
      .expect(201);
    const after = await Fraction.findByPk(fraction.id);
    expect(after!.verdictId).not.toBeNull();
    expect(after!.version).toBeGreaterThan(fraction.version);
  });

  it('gives the readings page by page, the newest first', async () => {
    const fraction = await freshFraction();
    for (const n of [1.3721, 1.3722, 1.3723])
      await chemist
        .post(pathOf(fraction))
        .send({ readings: [n], temperatureC: 20 })
        .expect(201);
    const first = await chemist.get(`${pathOf(fraction)}?limit=2`).expect(200);
    expect(first.body.items.map((one: { meanN: number }) => one.meanN)).toEqual([1.3723, 1.3722]);
    const rest = await chemist.get(`${pathOf(fraction)}?limit=2&cursor=${first.body.nextCursor}`).expect(200);
    expect(rest.body.items.map((one: { meanN: number }) => one.meanN)).toEqual([1.3721]);
    expect(rest.body.nextCursor).toBeNull();
  });
});

describe('readings that are refused', () => {
  it.each([
    ['none at all', { readings: [], temperatureC: 20 }, 'readings'],
    ['a slip of the finger', { readings: [13.723], temperatureC: 20 }, 'readings.0'],
    ['no temperature', { readings: [1.37] }, 'temperatureC'],
    [
      'a water temperature alone',
      { readings: [1.37], temperatureC: 20, waterTemperatureC: 20 },
      'waterReading',
    ],
    [
      'water read when it is too hot',
      { readings: [1.37], temperatureC: 45, waterReading: 1.33 },
      'waterTemperatureC',
    ],
    ['a field that is not known', { readings: [1.37], temperatureC: 20, brix: 12 }, ''],
  ])('%s: 422 that names the field', async (_, body, path) => {
    const answer = await chemist
      .post(pathOf(await freshFraction()))
      .send(body)
      .expect(422);
    expect(answer.body.errors[0].path).toBe(path);
  });

  it('by an analyst: 403; by another group: 404; by a token with the right: 201, without it: 403', async () => {
    const fraction = await freshFraction();
    const body = { readings: [1.3723], temperatureC: 20 };
    const analyst = await sessionOf(await buildUser({ group, roles: ['analyst'] }));
    await analyst.post(pathOf(fraction)).send(body).expect(403);
    const stranger = await sessionOf(await buildUser({ group: await buildGroup(), roles: ['chemist'] }));
    await stranger.post(pathOf(fraction)).send(body).expect(404);
    await stranger.get(pathOf(fraction)).expect(404);
    const mayRead = await buildToken({ group, scopes: ['readings:write'] });
    const { body: stored } = await (
      await withToken(mayRead.token)
    )
      .post(pathOf(fraction))
      .send(body)
      .expect(201);
    expect(stored.readBy).toContain('instrument PC');
    const mayNot = await buildToken({ group, scopes: ['evidence:write'] });
    await (await withToken(mayNot.token)).post(pathOf(fraction)).send(body).expect(403);
  });

  it('twice under one Idempotency-Key: one reading, the same answer', async () => {
    const fraction = await freshFraction();
    const { token } = await buildToken({ group, scopes: ['readings:write'] });
    const agent = await withToken(token);
    const send = () =>
      agent
        .post(pathOf(fraction))
        .set('Idempotency-Key', fraction.id)
        .send({ readings: [1.3723], temperatureC: 20 })
        .expect(201);
    const [first, second] = [await send(), await send()];
    expect(second.body.id).toBe(first.body.id);
    const { body } = await chemist.get(pathOf(fraction)).expect(200);
    expect(body.items).toHaveLength(1);
  });
});
