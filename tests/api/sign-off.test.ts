import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database/connection';
import { Fraction, OutboxMessage, Signature, Verdict } from '@/lib/database/records';
import {
  buildIntegratedTrace,
  buildKnownImpurity,
  buildSpecification,
  buildWater,
} from '../factories/acceptance';
import { type Bench, buildBench, buildSubmittedFraction, release } from '../factories/signing-bench';
import { buildCompound, buildFraction, buildRun, buildToken } from '../factories/records';
import { anonymous, stopTestServer, withToken } from '../support/test-server';

let bench: Bench;
beforeAll(async () => {
  bench = await buildBench();
});
afterAll(stopTestServer);

const at = (fraction: { code: string }, step: string) => `/api/v1/fractions/${fraction.code}/${step}`;

describe('submitting', () => {
  it('judges, keeps the specification, and mails the analysts', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const row = await Fraction.findByPk(fraction.id);
    expect(row).toMatchObject({ status: 'submitted', verdictState: 'pass', purityPercent: 99.6 });
    expect(row?.specificationId).not.toBeNull();
    const mail = await OutboxMessage.findAll({
      where: { recipient: bench.analyst.email, kind: 'fraction.submitted' },
    });
    expect(mail.some((message) => message.subject.includes(fraction.code))).toBe(true);
  });

  it('needs no body, but refuses a second time, another role and another group', async () => {
    const fraction = await buildFraction({ run: bench.run });
    await bench.analyst.agent.post(at(fraction, 'submit')).send({}).expect(403);
    const elsewhere = await buildBench();
    await elsewhere.chemist.agent.post(at(fraction, 'submit')).send({}).expect(404);
    await bench.chemist.agent.post(at(fraction, 'submit')).expect(200);
    const { body } = await bench.chemist.agent.post(at(fraction, 'submit')).send({}).expect(409);
    expect(body.detail).toContain('submitted');
  });

  it('honours a version that was sent', async () => {
    const fraction = await buildFraction({ run: bench.run });
    await bench.chemist.agent.post(at(fraction, 'submit')).set('if-match', '"99"').send({}).expect(409);
    await bench.chemist.agent
      .post(at(fraction, 'submit'))
      .set('if-match', `"${fraction.version}"`)
      .send({})
      .expect(200);
  });

  it('stores a verdict only when it differs from the last', async () => {
    const fraction = await buildSubmittedFraction(bench);
    await bench.analyst.agent.post(at(fraction, 'return')).send({ reason: 'label is missing' }).expect(200);
    await bench.chemist.agent.post(at(fraction, 'submit')).send({}).expect(200);
    expect(await Verdict.count({ where: { fractionId: fraction.id } })).toBe(1);
  });
});

describe('returning', () => {
  it('needs a reason, and mails it to the chemist', async () => {
    const fraction = await buildSubmittedFraction(bench);
    await bench.analyst.agent.post(at(fraction, 'return')).send({}).expect(422);
    await bench.chemist.agent.post(at(fraction, 'return')).send({ reason: 'mine' }).expect(403);
    await bench.analyst.agent
      .post(at(fraction, 'return'))
      .send({ reason: 'read the index again' })
      .expect(200);
    const [mail] = await OutboxMessage.findAll({
      where: { recipient: bench.chemist.email, kind: 'fraction.returned' },
      order: [['id', 'DESC']],
    });
    expect(mail?.body).toContain('read the index again');
    await bench.analyst.agent.post(at(fraction, 'return')).send({ reason: 'again' }).expect(409);
  });
});

describe('signing off', () => {
  it('is superseded by log readings added within the collection, not by earlier ones', async () => {
    const fraction = await buildSubmittedFraction(bench);
    await bench.analyst.agent.post(at(fraction, 'sign-off')).send(release(bench.analyst)).expect(200);
    const path = `/api/v1/runs/${bench.run.code}/readings`;
    const { collectedAt } = (await Fraction.findByPk(fraction.id))!;
    const send = (shiftMs: number) =>
      bench.chemist.agent
        .post(path)
        .send({
          readings: [{ at: new Date(collectedAt.getTime() + shiftMs).toISOString(), headTemperatureC: 77 }],
        })
        .expect(201);
    await send(-60_000);
    expect((await Fraction.findByPk(fraction.id))?.status).toBe('signed off');
    await send(0);
    expect((await Fraction.findByPk(fraction.id))?.status).toBe('reopened');
    const signature = await Signature.findOne({ where: { fractionId: fraction.id } });
    expect(signature?.supersededReason).toContain('log readings');
  });

  it('signs with password and meaning, and answers a signature with a public code', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const { body } = await bench.analyst.agent
      .post(at(fraction, 'sign-off'))
      .send(release(bench.analyst))
      .expect(200);
    expect(body).toMatchObject({
      status: 'signed off',
      signature: { inForce: true, signer: bench.analyst.name },
    });
    expect(body.signature.code).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}(-[0-9A-HJKMNP-TV-Z]{4}){2}$/);
    expect(body.signature.manifestDigest).toMatch(/^[0-9a-f]{64}$/);
    for (const person of [bench.chemist, bench.pi]) {
      const where = { recipient: person.email, kind: 'fraction.signed_off' };
      const mails = await OutboxMessage.findAll({ where });
      expect(mails.some((mail) => mail.body.includes(body.signature.code))).toBe(true);
    }
  });

  it('refuses a wrong password and signs nothing', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const signer = await bench.person(['analyst']);
    const wrong = { ...release(signer), password: 'not-the-password' };
    await signer.agent.post(at(fraction, 'sign-off')).send(wrong).expect(403);
    expect((await Fraction.findByPk(fraction.id))?.status).toBe('submitted');
  });

  it('makes an account wait after several wrong passwords, even with the right one', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const signer = await bench.person(['analyst']);
    for (let wrong = 0; wrong < 7; wrong++)
      await signer.agent
        .post(at(fraction, 'sign-off'))
        .send({ ...release(signer), password: `wrong-${wrong}` });
    const answer = await signer.agent.post(at(fraction, 'sign-off')).send(release(signer)).expect(429);
    expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0);
  });

  it('never lets the person who collected a fraction sign it', async () => {
    const both = await bench.person(['chemist', 'analyst']);
    const run = await buildRun({ group: bench.group, chemist: both, target: bench.compound });
    const fraction = await buildFraction({ run });
    await buildIntegratedTrace(fraction);
    await both.agent.post(at(fraction, 'submit')).send({}).expect(200);
    const { body } = await both.agent.post(at(fraction, 'sign-off')).send(release(both)).expect(403);
    expect(body.detail).toContain('You collected this fraction');
    await bench.analyst.agent.post(at(fraction, 'sign-off')).send(release(bench.analyst)).expect(200);
  });

  it('refuses a chemist, a token, nobody, another group, an open fraction and an unknown meaning', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const open = await buildFraction({ run: bench.run });
    const { token } = await buildToken({ group: bench.group });
    const elsewhere = await buildBench();
    await bench.chemist.agent.post(at(fraction, 'sign-off')).send(release(bench.chemist)).expect(403);
    await (await withToken(token)).post(at(fraction, 'sign-off')).send(release(bench.analyst)).expect(403);
    await (await anonymous()).post(at(fraction, 'sign-off')).send(release(bench.analyst)).expect(401);
    await elsewhere.analyst.agent.post(at(fraction, 'sign-off')).send(release(elsewhere.analyst)).expect(404);
    await bench.analyst.agent.post(at(open, 'sign-off')).send(release(bench.analyst)).expect(409);
    const odd = { ...release(bench.analyst), meaning: 'looks fine' };
    await bench.analyst.agent.post(at(fraction, 'sign-off')).send(odd).expect(422);
  });

  it('refuses a verdict that is not a pass, and says what to do', async () => {
    const failing = await buildSubmittedFraction(bench, 90);
    const fail = await bench.analyst.agent
      .post(at(failing, 'sign-off'))
      .send(release(bench.analyst))
      .expect(409);
    expect(fail.body.detail).toContain('Return the fraction');
    const run = await buildRun({ group: bench.group, chemist: bench.chemist, target: bench.compound });
    await buildKnownImpurity(run, await buildWater());
    const fraction = await buildFraction({ run });
    await buildIntegratedTrace(fraction);
    await bench.chemist.agent.post(at(fraction, 'submit')).send({}).expect(200);
    const blind = await bench.analyst.agent
      .post(at(fraction, 'sign-off'))
      .send(release(bench.analyst))
      .expect(409);
    expect(blind.body.detail).toContain('blind');
  });

  it('lets one of two people who sign at once win, and tells the other', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const answers = await Promise.all(
      [bench.analyst, bench.pi].map((person) =>
        person.agent.post(at(fraction, 'sign-off')).send(release(person)),
      ),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    const [row] = await database().query<{ n: number }>(
      'SELECT COUNT(*) AS n FROM signatures WHERE fractionId = ?',
      { replacements: [fraction.id], type: QueryTypes.SELECT },
    );
    expect(Number(row?.n)).toBe(1);
  });
});

describe('afterwards', () => {
  it('reopens with a reason and supersedes the signature without deleting it', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const signed = await bench.analyst.agent
      .post(at(fraction, 'sign-off'))
      .send(release(bench.analyst))
      .expect(200);
    await bench.analyst.agent.post(at(fraction, 'reopen')).send({}).expect(422);
    await bench.pi.agent.post(at(fraction, 'reopen')).send({ reason: 'wrong receiver' }).expect(200);
    const sheet = await bench.chemist.agent.get(`/api/v1/fractions/${fraction.code}`).expect(200);
    expect(sheet.body).toMatchObject({
      status: 'reopened',
      signatures: [{ code: signed.body.signature.code, inForce: false, supersededReason: 'wrong receiver' }],
    });
    expect(sheet.body.transitions.map((one: { action: string }) => one.action)).toEqual([
      'reopen',
      'sign off',
      'submit',
    ]);
  });

  it('supersedes the signature when anything under it changes', async () => {
    const fraction = await buildSubmittedFraction(bench);
    const signed = await bench.analyst.agent
      .post(at(fraction, 'sign-off'))
      .send(release(bench.analyst))
      .expect(200);
    await bench.chemist.agent
      .patch(`/api/v1/fractions/${fraction.code}`)
      .set('if-match', `"${signed.body.version}"`)
      .send({ grossMassG: 93, reason: 'weighed again' })
      .expect(200);
    const { body } = await bench.chemist.agent.get(`/api/v1/fractions/${fraction.code}`).expect(200);
    expect(body.status).toBe('reopened');
    expect(body.signatures[0].inForce).toBe(false);
  });
});

describe('read-only links', () => {
  it('are made for signed-off fractions by an analyst or PI, open without an account, and end when revoked', async () => {
    const fraction = await buildSubmittedFraction(bench);
    await bench.pi.agent.post(at(fraction, 'shares')).send({}).expect(409);
    await bench.analyst.agent.post(at(fraction, 'sign-off')).send(release(bench.analyst)).expect(200);
    await bench.chemist.agent.post(at(fraction, 'shares')).send({}).expect(403);
    await bench.pi.agent.post(at(fraction, 'shares')).send({ expiresInDays: 91 }).expect(422);
    const { body } = await bench.pi.agent.post(at(fraction, 'shares')).send({ expiresInDays: 5 }).expect(201);
    const visitor = await anonymous();
    const page = await visitor.get(`/share/${body.token}`).expect(200);
    expect(page.text).toContain(fraction.code);
    const list = await bench.pi.agent.get(at(fraction, 'shares')).expect(200);
    expect(JSON.stringify(list.body)).not.toContain(body.token);
    await bench.pi.agent.delete(`${at(fraction, 'shares')}?id=${body.id}`).expect(204);
    const gone = await visitor.get(`/share/${body.token}`);
    expect(gone.text).not.toContain(fraction.code);
    expect(gone.text).toContain('no longer');
  });
});

describe('what a sheet says of a fraction without a specification', () => {
  it('is incomplete, with the next step in words and every action with its reason', async () => {
    const run = await buildRun({ group: bench.group, chemist: bench.chemist, target: await buildCompound() });
    const fraction = await buildFraction({ run });
    const { body } = await bench.analyst.agent.get(`/api/v1/fractions/${fraction.code}`).expect(200);
    expect(body.verdict.state).toBe('incomplete');
    expect(body.verdict.summary).toContain('PI');
    expect(body.actions.submit).toContain('chemist');
    expect(body.actions.signOff).toContain('submitted');
    await buildSpecification({ ...bench, compound: { id: run.targetCompoundId } as never });
  });
});
