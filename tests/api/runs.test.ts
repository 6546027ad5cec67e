import { afterAll, describe, expect, it } from 'vitest';
import { benchOfOne, eventsOf, grantRole, personIn, runBody } from '../factories/bench';
import {
  buildCompound,
  buildEthylAcetate,
  buildGroup,
  buildRun,
  buildToken,
  buildUser,
} from '../factories/records';
import { anonymous, signedIn, stopTestServer, unique, withToken } from '../support/test-server';

afterAll(stopTestServer);

const number = (code: string) => Number(code.slice('D-2026-'.length));

describe('starting a run', () => {
  it('takes target and impurities by id or CAS number and answers the run with its code', async () => {
    const { group, agent, target } = await benchOfOne();
    const ester = await buildEthylAcetate();
    const body = runBody({ id: 'CAS 141-78-6' }, { knownImpurities: [target.id], plannedPressureMbar: 200 });
    const answer = await agent.post('/api/v1/runs').send(body).expect(201);
    expect(answer.body).toMatchObject({
      group: { id: group.id, name: group.name },
      targetCompound: { id: ester.id, name: 'ethyl acetate', cas: '141-78-6' },
      knownImpurities: [{ id: target.id, name: target.name, cas: null }],
      plannedPressureMbar: 200,
      chargeMassG: 250,
      endedAt: null,
    });
    expect(answer.body.code).toMatch(/^D-\d{4}-\d{4,}$/);
    expect(answer.headers.etag).toBe(`"${answer.body.version}"`);
    expect(answer.headers.location).toBe(`/api/v1/runs/${answer.body.code}`);
    const { body: again } = await agent.get(answer.headers.location as string).expect(200);
    expect(again).toEqual(answer.body);
  });

  it('leaves one audit event with all that was written', async () => {
    const { agent, target } = await benchOfOne();
    const { body } = await agent
      .post('/api/v1/runs')
      .send(runBody(target, { bath: 'oil' }))
      .expect(201);
    expect(await eventsOf(body.id)).toMatchObject([
      { type: 'run.created', after: { code: body.code, bath: 'oil', targetCompound: { id: target.id } } },
    ]);
  });

  it('numbers the year of the start', async () => {
    const { agent, target } = await benchOfOne();
    const start = runBody(target, { startedAt: '2019-05-03T08:00:00+02:00' });
    const { body } = await agent.post('/api/v1/runs').send(start).expect(201);
    expect(body.code).toMatch(/^D-2019-\d{4}$/);
    expect(body.startedAt).toBe('2019-05-03T06:00:00.000Z');
  });

  it('gives codes without gaps or doubles to calls at once, some of which fail', async () => {
    const { agent, target } = await benchOfOne();
    const startedAt = '2026-03-01T08:00:00Z';
    const start = (impurity?: string) =>
      agent
        .post('/api/v1/runs')
        .send(runBody(target, { startedAt, knownImpurities: impurity ? [impurity] : [] }));
    const calls = Array.from({ length: 20 }, (_, at) => start(at % 4 === 3 ? '64-17-6' : undefined));
    const answers = await Promise.all(calls);
    expect(answers.map((answer) => answer.status).sort()).toEqual([
      ...Array<number>(15).fill(201),
      ...Array<number>(5).fill(422),
    ]);
    const { body: last } = await start().expect(201);
    const numbers = answers.filter((a) => a.status === 201).map((a) => number(a.body.code));
    numbers.sort((a, b) => a - b);
    const first = numbers[0]!;
    expect(numbers).toEqual(Array.from({ length: 15 }, (_, at) => first + at));
    expect(number(last.code)).toBe(first + 15);
  });

  it.each([
    [{ targetCompound: '00000000-0000-7000-8000-000000000000' }, 'targetCompound'],
    [{ targetCompound: '141-78-7' }, 'targetCompound'],
    [{ knownImpurities: ['7732-18-4'] }, 'knownImpurities.0'],
    [{ technique: 'by magic' }, 'technique'],
    [{ chargeMassG: 0 }, 'chargeMassG'],
    [{ plannedPressureMbar: -5 }, 'plannedPressureMbar'],
    [{ endedAt: '2019-01-01T00:00:00Z', startedAt: '2019-01-02T00:00:00Z' }, 'endedAt'],
    [{ startedAt: '2199-01-01T00:00:00Z' }, 'startedAt'],
    [{ safetyChecks: { wornSocks: true } }, 'safetyChecks'],
    [{ group: '00000000-0000-7000-8000-000000000000' }, 'group'],
  ])('refuses %j and names the field', async (wrong, path) => {
    const { agent, target } = await benchOfOne();
    const { body } = await agent.post('/api/v1/runs').send(runBody(target, wrong)).expect(422);
    expect(body.errors[0].path).toContain(path);
  });

  it('refuses the target as its own impurity', async () => {
    const { agent, target } = await benchOfOne();
    const { body } = await agent
      .post('/api/v1/runs')
      .send(runBody(target, { knownImpurities: [target.id] }))
      .expect(422);
    expect(body.errors).toMatchObject([{ path: 'knownImpurities.0' }]);
  });

  it('asks for the group when the caller is chemist in two, and takes the one that is named', async () => {
    const { group, user, agent, target } = await benchOfOne();
    const second = await buildGroup();
    const both = await buildUser({ group, roles: ['chemist'] });
    await grantRole(both, second, 'chemist');
    const caller = await signedIn({ email: both.email, password: both.plainPassword });
    const refused = await caller.post('/api/v1/runs').send(runBody(target)).expect(422);
    expect(refused.body.errors[0].message).toContain(second.name);
    const { body } = await caller
      .post('/api/v1/runs')
      .send(runBody(target, { group: second.id }))
      .expect(201);
    expect(body.group.id).toBe(second.id);
    expect(body.chemist.id).not.toBe(user.id);
    await agent.get(`/api/v1/runs/${body.code}`).expect(404);
  });

  it('is for chemists only', async () => {
    const { group, target } = await benchOfOne();
    await (await anonymous()).post('/api/v1/runs').send(runBody(target)).expect(401);
    for (const role of ['analyst', 'pi'] as const) {
      const { agent } = await personIn(group, [role]);
      await agent.post('/api/v1/runs').send(runBody(target)).expect(403);
      await agent
        .post('/api/v1/runs')
        .send(runBody(target, { group: group.id }))
        .expect(403);
    }
    const { token } = await buildToken({ group });
    await (await withToken(token)).post('/api/v1/runs').send(runBody(target)).expect(403);
  });
});

describe('changing a run', () => {
  it('needs the version, refuses a stale one, and tells before and after', async () => {
    const { agent, target } = await benchOfOne();
    const { body: run } = await agent.post('/api/v1/runs').send(runBody(target)).expect(201);
    const path = `/api/v1/runs/${run.code}`;
    await agent.patch(path).send({ bath: 'oil' }).expect(428);
    await agent.patch(path).set('If-Match', 'yes').send({ bath: 'oil' }).expect(412);
    const { body: changed, headers } = await agent
      .patch(path)
      .set('If-Match', `"${run.version}"`)
      .send({ bath: 'oil', residueMassG: 21.5 })
      .expect(200);
    expect(changed).toMatchObject({ bath: 'oil', residueMassG: 21.5, version: run.version + 1 });
    expect(headers.etag).toBe(`"${changed.version}"`);
    await agent.patch(path).set('If-Match', `"${run.version}"`).send({ bath: 'sand' }).expect(409);
    const [, event] = await eventsOf(run.id);
    expect(event).toMatchObject({
      type: 'run.changed',
      before: { bath: null, residueMassG: null },
      after: { bath: 'oil', residueMassG: 21.5 },
    });
  });

  it('leaves version and audit trail alone when the same values are sent again', async () => {
    const { agent, target } = await benchOfOne();
    const { body: run } = await agent.post('/api/v1/runs').send(runBody(target)).expect(201);
    const { body } = await agent
      .patch(`/api/v1/runs/${run.code}`)
      .set('If-Match', `"${run.version}"`)
      .send({ chargeMassG: 250, technique: 'fractional', startedAt: run.startedAt })
      .expect(200);
    expect(body.version).toBe(run.version);
    expect(await eventsOf(run.id)).toHaveLength(1);
  });

  it('replaces the known impurities as a set and raises the version', async () => {
    const { agent, target } = await benchOfOne();
    const [first, second] = [await buildCompound(), await buildCompound()];
    const start = runBody(target, { knownImpurities: [first.id] });
    const { body: run } = await agent.post('/api/v1/runs').send(start).expect(201);
    const { body } = await agent
      .patch(`/api/v1/runs/${run.code}`)
      .set('If-Match', `"${run.version}"`)
      .send({ knownImpurities: [second.id] })
      .expect(200);
    expect(body.knownImpurities.map((c: { id: string }) => c.id)).toEqual([second.id]);
    expect(body.version).toBe(run.version + 1);
  });

  it('ends a run, and refuses an end before the start', async () => {
    const { agent, target } = await benchOfOne();
    const start = runBody(target, { startedAt: '2026-10-05T08:00:00Z' });
    const { body: run } = await agent.post('/api/v1/runs').send(start).expect(201);
    const end = (endedAt: string) =>
      agent.patch(`/api/v1/runs/${run.code}`).set('If-Match', `"${run.version}"`).send({ endedAt });
    await end('2026-10-05T07:59:00Z').expect(422);
    const { body } = await end('2026-10-05T12:30:00Z').expect(200);
    expect(body.endedAt).toBe('2026-10-05T12:30:00.000Z');
  });

  it('is 404 for another group, 403 for an analyst, 401 for nobody', async () => {
    const { group, agent, target } = await benchOfOne();
    const { body: run } = await agent.post('/api/v1/runs').send(runBody(target)).expect(201);
    const stranger = await personIn(await buildGroup(), ['chemist']);
    const analyst = await personIn(group, ['analyst']);
    const change = (who: typeof agent) =>
      who.patch(`/api/v1/runs/${run.code}`).set('If-Match', `"${run.version}"`).send({ bath: 'oil' });
    await change(stranger.agent).expect(404);
    await stranger.agent.get(`/api/v1/runs/${run.code}`).expect(404);
    await change(analyst.agent).expect(403);
    await analyst.agent.get(`/api/v1/runs/${run.code}`).expect(200);
    await change(await anonymous()).expect(401);
  });
});

describe('listing runs', () => {
  it('walks the runs of the caller by cursor, the latest first, each once', async () => {
    const { group, user, agent, target } = await benchOfOne();
    // Two share their time, so that the id has to tell them apart.
    for (const day of [1, 2, 2, 3, 4]) {
      await buildRun({ group, chemist: user, target, startedAt: new Date(Date.UTC(2026, 4, day)) });
    }
    await buildRun();
    const seen: string[] = [];
    let cursor = '';
    do {
      const { body } = await agent.get(`/api/v1/runs?limit=2${cursor && `&cursor=${cursor}`}`).expect(200);
      seen.push(...body.items.map((run: { startedAt: string }) => run.startedAt.slice(8, 10)));
      cursor = body.nextCursor ?? '';
    } while (cursor);
    expect(seen).toEqual(['04', '03', '02', '02', '01']);
  });

  it('finds runs by a part of the source, with LIKE signs taken as they are', async () => {
    const { agent, target } = await benchOfOne();
    const source = `${unique('drum')} 100%_pure`;
    await agent
      .post('/api/v1/runs')
      .send(runBody(target, { chargeSource: source }))
      .expect(201);
    await agent.post('/api/v1/runs').send(runBody(target)).expect(201);
    const found = await agent.get('/api/v1/runs').query({ q: '100%_p' }).expect(200);
    expect(found.body.items).toHaveLength(1);
    expect(found.body.items[0]).toMatchObject({ fractionCount: 0, targetCompound: { id: target.id } });
  });

  it('refuses what it does not know', async () => {
    const { agent } = await benchOfOne();
    await agent.get('/api/v1/runs?page=2').expect(400);
    await agent.get('/api/v1/runs?limit=201').expect(400);
    await agent.get('/api/v1/runs?cursor=nonsense').expect(400);
    await (await anonymous()).get('/api/v1/runs').expect(401);
  });
});

describe('the cautions of a planned still', () => {
  it('come from the records of the compounds and the conditions', async () => {
    const { agent } = await benchOfOne();
    const ether = await buildCompound({ peroxideClass: 'A' });
    const ask = (query: object) => agent.get('/api/v1/runs/cautions').query(query);
    const { body } = await ask({ compounds: ether.id, pressureMbar: 20 }).expect(200);
    const codes = body.cautions.map((caution: { code: string }) => caution.code);
    expect(codes).toEqual(
      expect.arrayContaining(['peroxides', 'implosion', 'closed-system', 'hazards-not-recorded']),
    );
    const atAir = await ask({ compounds: ether.id }).expect(200);
    expect(atAir.body.cautions.map((caution: { code: string }) => caution.code)).not.toContain('implosion');
    await ask({ compounds: 'ether' }).expect(400);
    await (await anonymous()).get('/api/v1/runs/cautions').query({ compounds: ether.id }).expect(401);
  });
});
