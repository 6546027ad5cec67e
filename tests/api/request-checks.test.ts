import { get as httpGet } from 'node:http';
import { afterAll, describe, expect, it } from 'vitest';
import { benchOfOne, runBody } from '../factories/bench';
import { buildFraction, buildRun } from '../factories/records';
import { anonymous, stopTestServer, testServer, unique } from '../support/test-server';

afterAll(stopTestServer);

describe('a body', () => {
  it('with half a character, a control character or a turn of direction is refused by the name of its field', async () => {
    const { agent, target } = await benchOfOne();
    for (const bad of ['\ud800x', 'a\u0000b', 'a\u007f', 'a\u202eb']) {
      const text = JSON.stringify(runBody(target, { chargeSource: bad }));
      const { body } = await agent.post('/api/v1/runs').type('json').send(text).expect(422);
      expect(body.errors).toMatchObject([{ path: 'chargeSource' }]);
      expect(body.detail).toMatch(/^Check "chargeSource": This text holds/);
    }
    await agent
      .post('/api/v1/runs')
      .send(runBody(target, { note: 'two\nlines' }))
      .expect(201);
  });

  it('that is refused says so in a sentence', async () => {
    const { group, user, agent, target } = await benchOfOne();
    const run = await buildRun({ group, chemist: user, target });
    const fraction = await buildFraction({ run });
    const path = `/api/v1/fractions/${fraction.code}`;
    const { body } = await agent.patch(path).set('If-Match', `"${fraction.version}"`).send({}).expect(422);
    expect(body.detail).toBe('Send at least one field to change.');
    const nothing = await agent.post('/api/v1/runs').type('json').send('null').expect(422);
    expect(nothing.body.detail).toBe('Give an object in braces, with its fields by name.');
  });
});

describe('a query', () => {
  it('with an empty number is read as without it', async () => {
    const { group, user, agent, target } = await benchOfOne();
    const run = await buildRun({ group, chemist: user, target });
    await buildFraction({ run });
    for (const blank of ['', '%20'])
      expect((await agent.get(`/api/v1/fractions?purityMin=${blank}`).expect(200)).body.items).toHaveLength(
        1,
      );
    const { body } = await agent.get('/api/v1/fractions?purityMin=abc').expect(400);
    expect(body.detail).toBe('Check the query parameters: "purityMin": Give a number.');
  });

  it('with a cursor that was tampered with is refused', async () => {
    const { agent } = await benchOfOne();
    for (const key of [{ a: 1 }, true, ['2026-11-02'], 'soon']) {
      const cursor = Buffer.from(JSON.stringify(['-collectedAt', key, 'x'])).toString('base64url');
      const { body } = await agent.get(`/api/v1/fractions?cursor=${cursor}`).expect(400);
      expect(body.detail).toContain('Start again without a cursor');
    }
  });
});

describe('an address', () => {
  it('under /api that leads nowhere is answered as a problem, whatever the method', async () => {
    const agent = await anonymous();
    for (const method of ['get', 'post', 'put', 'patch', 'delete'] as const) {
      const answer = await agent[method]('/api/v1/nothing/here').expect(404);
      expect(answer.headers['content-type']).toContain('application/problem+json');
      expect(answer.headers['x-content-type-options']).toBe('nosniff');
    }
    await agent.get('/api/auth/csrf').expect(200);
  });

  it.each(['/api/v1/fractions/%E0%A4%A', '/verify/%E0%A4%A'])(
    'that cannot be decoded is refused: %s',
    async (path) => {
      const { port } = await testServer();
      const status = await new Promise((resolve, reject) => {
        httpGet({ host: '127.0.0.1', port, path }, (answer) => {
          answer.resume();
          resolve(`${answer.statusCode} ${answer.headers['content-type']}`);
        }).on('error', reject);
      });
      expect(status).toBe(
        `400 ${path.startsWith('/api/') ? 'application/problem+json' : 'text/plain; charset=utf-8'}`,
      );
    },
  );
});

it('the same Idempotency-Key with another If-Match is another request', async () => {
  const { group, user, agent, target } = await benchOfOne();
  const run = await buildRun({ group, chemist: user, target });
  const change = (version: number) =>
    agent
      .patch(`/api/v1/runs/${run.code}`)
      .set('Idempotency-Key', key)
      .set('If-Match', `"${version}"`)
      .send({ note: 'again' });
  const key = unique('key');
  const first = await change(run.version).expect(200);
  expect(first.headers['x-content-type-options']).toBe('nosniff');
  expect((await change(run.version).expect(200)).headers['idempotent-replay']).toBe('true');
  await change(run.version + 1).expect(422);
});
