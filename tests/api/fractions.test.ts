import { afterAll, describe, expect, it } from 'vitest';
import { recorded } from '@/lib/audit/recorded';
import { systemActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import { type Fraction, Signature, Verdict } from '@/lib/database/records';
import { benchOfOne, eventsOf, personIn, runBody } from '../factories/bench';
import { buildFraction, buildGroup, buildRun, buildToken } from '../factories/records';
import { anonymous, stopTestServer, unique, withToken } from '../support/test-server';

afterAll(stopTestServer);

async function benchWithRun() {
  const bench = await benchOfOne();
  const { body: run } = await bench.agent.post('/api/v1/runs').send(runBody(bench.target)).expect(201);
  return { ...bench, run, path: `/api/v1/runs/${run.code}/fractions` };
}

const heart = {
  cut: 'heart',
  headTemperatureFromC: 76.8,
  headTemperatureToC: 77.3,
  pressureMbar: 1013,
  tareMassG: 50.12,
  grossMassG: 92.62,
};

describe('starting a fraction', () => {
  it('takes the next number of the run, the run’s target and the caller, and has a verdict at once', async () => {
    const { agent, user, target, run, path } = await benchWithRun();
    const answer = await agent.post(path).send(heart).expect(201);
    expect(answer.body).toMatchObject({
      ...heart,
      code: `${run.code}-F1`,
      run: run.code,
      number: 1,
      compound: { id: target.id, name: target.name },
      netMassG: 42.5,
      status: 'open',
      verdict: 'incomplete',
      collectedBy: { id: user.id, name: user.name },
    });
    expect(answer.headers.etag).toBe(`"${answer.body.version}"`);
    const types = (await eventsOf(answer.body.id)).map((event) => event.type);
    expect(types).toContain('fraction.created');
    expect(types).toContain('fraction.judged');
  });

  it('numbers fractions without gaps when several are started at once and some are refused', async () => {
    const { agent, run, path } = await benchWithRun();
    const wrong = { ...heart, grossMassG: 1 };
    const calls = Array.from({ length: 20 }, (_, at) => agent.post(path).send(at % 5 === 4 ? wrong : heart));
    const answers = await Promise.all(calls);
    const made = answers.filter((answer) => answer.status === 201).map((answer) => answer.body.number);
    expect(made.sort((a, b) => a - b)).toEqual(Array.from({ length: 16 }, (_, at) => at + 1));
    expect(answers.filter((answer) => answer.status === 422)).toHaveLength(4);
    const { body } = await agent.get(path).expect(200);
    expect(body.items.map((fraction: { code: string }) => fraction.code)).toEqual(
      made.map((number) => `${run.code}-F${number}`),
    );
  });

  it('does not raise the version of the run, so that an edit of the run goes on', async () => {
    const { agent, run, path } = await benchWithRun();
    await agent.post(path).send({ cut: 'fore-run' }).expect(201);
    const { body } = await agent.get(`/api/v1/runs/${run.code}`).expect(200);
    expect(body.version).toBe(run.version);
  });

  it.each([
    [{ cut: 'middle' }, 'cut'],
    [{ cut: 'heart', tareMassG: 50, grossMassG: 49.99 }, 'grossMassG'],
    [{ cut: 'heart', headTemperatureFromC: 900 }, 'headTemperatureFromC'],
    [{ cut: 'heart', pressureMbar: 0 }, 'pressureMbar'],
    [{ cut: 'heart', collectedAt: 'yesterday' }, 'collectedAt'],
    [{ cut: 'heart', collectedAt: '2199-01-01T00:00:00Z' }, 'collectedAt'],
  ])('refuses %j and names the field', async (body, path) => {
    const { agent, path: url } = await benchWithRun();
    const answer = await agent.post(url).send(body).expect(422);
    expect(answer.body.errors[0].path).toBe(path);
  });

  it('is for the chemists of the group', async () => {
    const { group, path } = await benchWithRun();
    const { agent: analyst } = await personIn(group, ['analyst', 'pi']);
    const { agent: stranger } = await personIn(await buildGroup(), ['chemist']);
    await analyst.post(path).send(heart).expect(403);
    await stranger.post(path).send(heart).expect(404);
    await stranger.get(path).expect(404);
    await (await anonymous()).post(path).send(heart).expect(401);
    await (await withToken((await buildToken({ group })).token)).post(path).send(heart).expect(403);
  });
});

describe('changing a fraction', () => {
  async function benchWithFraction(fields = {}) {
    const bench = await benchWithRun();
    const { body: fraction } = await bench.agent
      .post(bench.path)
      .send({ ...heart, ...fields })
      .expect(201);
    const patch = (body: object, version = fraction.version, who = bench.agent) =>
      who.patch(`/api/v1/fractions/${fraction.code}`).set('If-Match', `"${version}"`).send(body);
    return { ...bench, fraction, patch };
  }

  it('writes what changed with before and after, and answers the new version', async () => {
    const { fraction, patch } = await benchWithFraction();
    const { body, headers } = await patch({ cut: 'tail', grossMassG: 93, tareMassG: 50.12 }).expect(200);
    expect(body).toMatchObject({ cut: 'tail', grossMassG: 93, netMassG: 42.88 });
    expect(body.version).toBeGreaterThan(fraction.version);
    expect(headers.etag).toBe(`"${body.version}"`);
    const changed = (await eventsOf(fraction.id)).filter((event) => event.type === 'fraction.changed');
    expect(changed).toMatchObject([
      { before: { cut: 'heart', grossMassG: 92.62 }, after: { cut: 'tail', grossMassG: 93 } },
    ]);
    expect(Object.keys(changed[0]!.after as object).sort()).toEqual(['cut', 'grossMassG']);
  });

  it('empties a field with null, and checks the masses against what stays', async () => {
    const { patch } = await benchWithFraction();
    const refused = await patch({ tareMassG: 200 }).expect(422);
    expect(refused.body.errors[0].path).toBe('grossMassG');
    const { body } = await patch({ grossMassG: null, tareMassG: 200 }).expect(200);
    expect(body).toMatchObject({ grossMassG: null, tareMassG: 200, netMassG: null });
  });

  it('needs the version and refuses a stale one', async () => {
    const { agent, fraction, patch } = await benchWithFraction();
    await agent.patch(`/api/v1/fractions/${fraction.code}`).send({ cut: 'tail' }).expect(428);
    await patch({ cut: 'tail' }).expect(200);
    await patch({ cut: 'fore-run' }).expect(409);
    await patch({}, fraction.version + 1).expect(422);
  });

  it('is 404 for another group and 403 for an analyst', async () => {
    const { group, fraction, patch } = await benchWithFraction();
    const { agent: analyst } = await personIn(group, ['analyst']);
    const { agent: stranger } = await personIn(await buildGroup(), ['chemist']);
    await patch({ cut: 'tail' }, fraction.version, analyst).expect(403);
    await patch({ cut: 'tail' }, fraction.version, stranger).expect(404);
  });

  it('needs a reason once it is signed off, and ends the signature', async () => {
    const { group, user, agent, target } = await benchOfOne();
    const run = await buildRun({ group, chemist: user, target });
    const fraction = await buildFraction({ run, status: 'signed off' });
    const signature = await sign(fraction, (await personIn(group, ['analyst'])).user.id);
    const patch = (body: object) =>
      agent.patch(`/api/v1/fractions/${fraction.code}`).set('If-Match', `"${fraction.version}"`).send(body);
    const refused = await patch({ storagePlace: 'cold room' }).expect(422);
    expect(refused.body.errors[0].path).toBe('reason');
    expect((await signature.reload()).supersededAt).toBeNull();
    const { body } = await patch({ storagePlace: 'cold room', reason: 'moved' }).expect(200);
    expect(body.status).toBe('reopened');
    const ended = await signature.reload();
    expect(ended.supersededAt).not.toBeNull();
    expect(ended.supersededReason).toBe('storage place changed: moved');
    const changed = (await eventsOf(fraction.id)).find((event) => event.type === 'fraction.changed');
    expect(changed?.reason).toBe('moved');
  });

  it('of the run’s known impurities ends the signature too, and needs a reason', async () => {
    const { group, user, agent, target } = await benchOfOne();
    const run = await buildRun({ group, chemist: user, target });
    const fraction = await buildFraction({ run, status: 'signed off' });
    const signature = await sign(fraction, user.id);
    const impurity = (await benchOfOne()).target;
    const patch = async (body: object) => {
      await run.reload();
      return agent.patch(`/api/v1/runs/${run.code}`).set('If-Match', `"${run.version}"`).send(body);
    };
    expect((await patch({ knownImpurities: [impurity.id] })).status).toBe(422);
    expect((await patch({ knownImpurities: [impurity.id], reason: 'found by GC' })).status).toBe(200);
    expect((await signature.reload()).supersededReason).toContain('found by GC');
    expect((await fraction.reload()).status).toBe('reopened');
  });
});

/** A signature in force on the fraction, as signing off leaves one. */
async function sign(fraction: Fraction, signerId: string): Promise<Signature> {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'fraction.signed_off', recordType: 'fraction', recordId: fraction.id });
    const verdict = await Verdict.create(
      {
        id: newId(),
        fractionId: fraction.id,
        state: 'pass',
        criteria: { summary: '', results: [] },
        coverage: [],
        engineVersion: 'test',
        contentDigest: '0'.repeat(64),
      },
      { transaction },
    );
    return Signature.create(
      {
        id: newId(),
        code: unique('S'),
        fractionId: fraction.id,
        signerId,
        signerName: 'Invented Signer',
        role: 'analyst',
        meaning: 'I have checked the evidence',
        manifest: '{}',
        manifestDigest: '0'.repeat(64),
        verdictId: verdict.id,
        signedAt: new Date(),
      },
      { transaction },
    );
  });
}
