import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Fraction } from '@/lib/database/records';
import { buildIntegratedTrace } from '../factories/acceptance';
import { type Bench, buildBench } from '../factories/signing-bench';
import { buildCompound, buildFraction, buildRun } from '../factories/records';
import { anonymous, stopTestServer } from '../support/test-server';

let bench: Bench;
beforeAll(async () => {
  bench = await buildBench();
});
afterAll(stopTestServer);

const limits = { criteria: { gcAreaPercentMin: 99.5 } };
const of = (compound: { id: string }) => `/api/v1/compounds/${compound.id}/specifications`;

describe('specifications', () => {
  it('are written in editions, and a new one leaves the old one as it is', async () => {
    const compound = await buildCompound();
    const first = await bench.pi.agent
      .post(of(compound))
      .send({ ...limits, approve: true })
      .expect(201);
    expect(first.body).toMatchObject({ edition: 1, inForce: true, approvedBy: bench.pi.name });
    const second = await bench.pi.agent
      .post(of(compound))
      .send({ criteria: { gcAreaPercentMin: 99 }, approve: true })
      .expect(201);
    expect(second.body).toMatchObject({ edition: 2, inForce: true });
    const { body } = await bench.chemist.agent.get(of(compound)).expect(200);
    expect(body.items).toMatchObject([
      { edition: 2, criteria: { gcAreaPercentMin: 99 }, inForce: true },
      { edition: 1, criteria: limits.criteria, inForce: false },
    ]);
  });

  it('are in force only when approved, once, with the version', async () => {
    const compound = await buildCompound();
    const { body } = await bench.pi.agent.post(of(compound)).send(limits).expect(201);
    expect(body).toMatchObject({ approvedAt: null, inForce: false });
    const approve = `/api/v1/specifications/${body.id}/approve`;
    await bench.pi.agent.post(approve).expect(428);
    await bench.analyst.agent.post(approve).set('if-match', '"0"').expect(403);
    await bench.pi.agent.post(approve).set('if-match', '"9"').expect(409);
    const done = await bench.pi.agent.post(approve).set('if-match', `"${body.version}"`).expect(200);
    expect(done.body.inForce).toBe(true);
    await bench.pi.agent.post(approve).set('if-match', `"${done.body.version}"`).expect(409);
    const elsewhere = await buildBench();
    await elsewhere.pi.agent.post(approve).set('if-match', '"0"').expect(404);
  });

  it('judge the open fractions of the group at once', async () => {
    const compound = await buildCompound();
    const run = await buildRun({ group: bench.group, chemist: bench.chemist, target: compound });
    const fraction = await buildFraction({ run });
    await buildIntegratedTrace(fraction, { purityPercent: 97 });
    await bench.pi.agent
      .post(of(compound))
      .send({ ...limits, approve: true })
      .expect(201);
    expect((await Fraction.findByPk(fraction.id))?.verdictState).toBe('fail');
  });

  it('do not change what a submitted fraction is judged by', async () => {
    const compound = await buildCompound();
    await bench.pi.agent
      .post(of(compound))
      .send({ criteria: { gcAreaPercentMin: 95 }, approve: true })
      .expect(201);
    const run = await buildRun({ group: bench.group, chemist: bench.chemist, target: compound });
    const fraction = await buildFraction({ run });
    await buildIntegratedTrace(fraction, { purityPercent: 97 });
    await bench.chemist.agent.post(`/api/v1/fractions/${fraction.code}/submit`).send({}).expect(200);
    await bench.pi.agent
      .post(of(compound))
      .send({ ...limits, approve: true })
      .expect(201);
    const { body } = await bench.analyst.agent.get(`/api/v1/fractions/${fraction.code}`).expect(200);
    expect(body.verdict).toMatchObject({ state: 'pass', specification: { edition: 1 } });
  });

  it('are refused from anybody but a PI, for unknown compounds, and without a real limit', async () => {
    const compound = await buildCompound();
    await bench.chemist.agent.post(of(compound)).send(limits).expect(403);
    await bench.analyst.agent.post(of(compound)).send(limits).expect(403);
    await (await anonymous()).post(of(compound)).send(limits).expect(401);
    await bench.pi.agent
      .post(of({ id: '01980000-0000-7000-8000-000000000000' }))
      .send(limits)
      .expect(404);
    await bench.pi.agent.post(of(compound)).send({ criteria: {} }).expect(422);
    await bench.pi.agent
      .post(of(compound))
      .send({ criteria: { gcAreaPercentMin: 120 } })
      .expect(422);
    await bench.pi.agent
      .post(of(compound))
      .send({ criteria: { tlcCleanUnder: ['moonlight'] } })
      .expect(422);
  });

  it('are not seen by another group', async () => {
    const compound = await buildCompound();
    await bench.pi.agent.post(of(compound)).send(limits).expect(201);
    const elsewhere = await buildBench();
    const { body } = await elsewhere.pi.agent.get(of(compound)).expect(200);
    expect(body.items).toEqual([]);
  });
});
