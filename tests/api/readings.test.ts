import { afterAll, describe, expect, it } from 'vitest';
import { benchOfOne, eventsOf, personIn } from '../factories/bench';
import { buildGroup, buildRun, buildToken } from '../factories/records';
import { stopTestServer, withToken } from '../support/test-server';

afterAll(stopTestServer);

const start = Date.UTC(2026, 9, 5, 8);
const reading = (minute: number, fields = {}) => ({
  at: new Date(start + minute * 60_000).toISOString(),
  headTemperatureC: 70 + minute / 100,
  ...fields,
});

async function benchWithRun() {
  const bench = await benchOfOne();
  const run = await buildRun({ group: bench.group, chemist: bench.user, target: bench.target });
  return { ...bench, run, path: `/api/v1/runs/${run.code}/readings` };
}

describe('log readings', () => {
  it('come back in the order of their times, by pages', async () => {
    const { agent, path } = await benchWithRun();
    const readings = [reading(3), reading(1, { pressureMbar: 20, note: 'first drop' }), reading(2)];
    await agent.post(path).send({ readings }).expect(201);
    const first = await agent.get(`${path}?limit=2`).expect(200);
    expect(first.body.items).toMatchObject([
      { at: '2026-10-05T08:01:00.000Z', pressureMbar: 20, note: 'first drop', sentBy: 'user' },
      { at: '2026-10-05T08:02:00.000Z', pressureMbar: null },
    ]);
    const second = await agent.get(`${path}?limit=2&cursor=${first.body.nextCursor}`).expect(200);
    expect(second.body.items).toMatchObject([{ at: '2026-10-05T08:03:00.000Z' }]);
    expect(second.body.nextCursor).toBeNull();
  });

  it('are taken ten thousand at once, with one audit event that tells count and range', async () => {
    const { agent, run, path } = await benchWithRun();
    const readings = Array.from({ length: 10_000 }, (_, at) => reading(at));
    const { body } = await agent.post(path).send({ readings }).expect(201);
    const range = { count: 10_000, firstAt: readings[0]!.at, lastAt: readings[9_999]!.at };
    expect(body).toEqual({ run: run.code, ...range });
    const events = (await eventsOf(run.id)).filter((event) => event.type === 'readings.added');
    expect(events).toMatchObject([{ after: range }]);
  });

  it('are refused above ten thousand, empty, without a value, or outside what a still shows', async () => {
    const { agent, path } = await benchWithRun();
    const many = Array.from({ length: 10_001 }, (_, at) => ({ at: reading(at).at, volumeMl: 1 }));
    await agent.post(path).send({ readings: many }).expect(422);
    await agent.post(path).send({ readings: [] }).expect(422);
    await agent
      .post(path)
      .send({ readings: [{ at: reading(1).at }] })
      .expect(422);
    const hot = await agent
      .post(path)
      .send({ readings: [reading(1), reading(2, { headTemperatureC: 5000 })] })
      .expect(422);
    expect(hot.body.errors[0].path).toBe('readings.1.headTemperatureC');
    const { body } = await agent.get(path).expect(200);
    expect(body.items).toEqual([]);
  });

  it('may be sent by a token with readings:write of the same group, and by no other', async () => {
    const { group, run, path, agent } = await benchWithRun();
    const readings = [reading(1)];
    const good = await withToken((await buildToken({ group, scopes: ['readings:write'] })).token);
    const narrow = await withToken((await buildToken({ group, scopes: ['evidence:write'] })).token);
    const foreign = await withToken((await buildToken({ scopes: ['readings:write'] })).token);
    await good.post(path).send({ readings }).expect(201);
    await narrow.post(path).send({ readings }).expect(403);
    await foreign.post(path).send({ readings }).expect(404);
    await good.get(path).expect(403);
    const { body } = await agent.get(path).expect(200);
    expect(body.items).toMatchObject([{ sentBy: 'token' }]);
    expect(run.code).toBeTruthy();
  });

  it('sent again with the same Idempotency-Key are there once', async () => {
    const { group, path, agent } = await benchWithRun();
    const sender = await withToken((await buildToken({ group, scopes: ['readings:write'] })).token);
    const send = () =>
      sender
        .post(path)
        .set('Idempotency-Key', 'minute-1')
        .send({ readings: [reading(1)] });
    const first = await send().expect(201);
    const second = await send().expect(201);
    expect(second.body).toEqual(first.body);
    const { body } = await agent.get(path).expect(200);
    expect(body.items).toHaveLength(1);
  });

  it('are for chemists: 403 for an analyst, 404 for another group', async () => {
    const { group, path } = await benchWithRun();
    const analyst = await personIn(group, ['analyst']);
    const stranger = await personIn(await buildGroup(), ['chemist']);
    await analyst.agent
      .post(path)
      .send({ readings: [reading(1)] })
      .expect(403);
    await analyst.agent.get(path).expect(200);
    await stranger.agent
      .post(path)
      .send({ readings: [reading(1)] })
      .expect(404);
    await stranger.agent.get(path).expect(404);
  });
});
