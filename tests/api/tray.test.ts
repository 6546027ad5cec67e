import { randomBytes } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database/connection';
import { EvidenceFile, Fraction } from '@/lib/database/records';
import { buildFraction, buildGroup, buildRun, buildToken, buildUser } from '../factories/records';
import { type Agent, signedIn, stopTestServer, withToken } from '../support/test-server';

let group: Awaited<ReturnType<typeof buildGroup>>;
let built: Awaited<ReturnType<typeof buildToken>>;
let token: Agent;
let analyst: Agent;
let fraction: Awaited<ReturnType<typeof buildFraction>>;

const bytesOf = () =>
  Buffer.from(
    `t,s\n${Array.from({ length: 20 }, (_, i) => `${i},${i * i}`).join('\n')}\n# ${randomBytes(8).toString('hex')}\n`,
  );
const send = (agent: Agent, query: string, bytes: Buffer) =>
  agent
    .post(`/api/v1/evidence?${query}`)
    .set('X-Filename', 'gc.csv')
    .set('Content-Type', 'text/csv')
    .send(bytes);
const file = (agent: Agent, id: string, code: string) =>
  agent.post(`/api/v1/tray/${id}/file`).send({ fraction: code });
async function waiting(
  bytes = bytesOf(),
  query = 'fraction=D-0000-0000-F7',
): Promise<{ id: string; evidenceId: string }> {
  const { body } = await send(token, query, bytes).expect(202);
  return { id: body.tray.id, evidenceId: body.evidence.id };
}

beforeAll(async () => {
  group = await buildGroup();
  built = await buildToken({ group });
  token = await withToken(built.token);
  const person = await buildUser({ group, roles: ['analyst'] });
  analyst = await signedIn({ email: person.email, password: person.plainPassword });
  fraction = await buildFraction({ run: await buildRun({ group }) });
});
afterAll(stopTestServer);

describe('the tray', () => {
  it('lists what waits, the newest first, page by page, with sender and reason', async () => {
    const one = await waiting();
    const two = await waiting(bytesOf(), '');
    const { body } = await analyst.get('/api/v1/tray?limit=1').expect(200);
    expect(body.items[0]).toMatchObject({ id: two.id, instrument: built.instrument.name, askedFor: null });
    const next = await analyst.get(`/api/v1/tray?limit=1&cursor=${body.nextCursor}`).expect(200);
    expect(next.body.items[0]).toMatchObject({ id: one.id, askedFor: 'D-0000-0000-F7' });
    expect(next.body.items[0].reason).toContain('D-0000-0000-F7');
    expect(next.body.items[0].evidence.id).toBe(one.evidenceId);
    await analyst.get('/api/v1/tray?cursor=nonsense').expect(400);
  });

  it('gives a file its fraction, its run and an audit event, once', async () => {
    const { id, evidenceId } = await waiting();
    const { body } = await file(analyst, id, fraction.code).expect(200);
    expect(body.evidence).toMatchObject({ id: evidenceId, fraction: fraction.code });
    expect(body.filedAt).not.toBeNull();
    const row = await EvidenceFile.findByPk(evidenceId);
    expect(row).toMatchObject({ fractionId: fraction.id, runId: fraction.runId });
    const events = await database().query<{ type: string }>(
      'SELECT type FROM audit_events WHERE recordId = ? ORDER BY sequence',
      { replacements: [evidenceId], type: QueryTypes.SELECT },
    );
    expect(events.map((event) => event.type)).toEqual(['evidence.uploaded', 'tray.filed']);
    const list = await analyst.get('/api/v1/tray?limit=200').expect(200);
    expect(list.body.items.map((item: { id: string }) => item.id)).not.toContain(id);
    const again = await file(analyst, id, fraction.code).expect(409);
    expect(again.body.detail).toContain('left the tray');
  });

  it('says so when the fraction has the very same file already, and keeps it in the tray', async () => {
    const bytes = bytesOf();
    await send(token, `fraction=${fraction.code}`, bytes).expect(201);
    const { id } = await waiting(bytes);
    const { body } = await file(analyst, id, fraction.code).expect(409);
    expect(body.detail).toContain('the very same file');
    const list = await analyst.get('/api/v1/tray?limit=200').expect(200);
    expect(list.body.items.map((item: { id: string }) => item.id)).toContain(id);
  });

  it('is filed once when two people do it at the same moment', async () => {
    const { id } = await waiting();
    const other = await buildFraction({ run: await buildRun({ group }) });
    const answers = await Promise.all([file(analyst, id, fraction.code), file(analyst, id, other.code)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
  });

  it('supersedes the signature of the fraction that gets the file', async () => {
    const signed = await buildFraction({ run: await buildRun({ group }), status: 'signed off' });
    await file(analyst, (await waiting()).id, signed.code).expect(200);
    expect((await Fraction.findByPk(signed.id))?.status).toBe('reopened');
  });

  it('is seen and emptied only by chemists and analysts of its group', async () => {
    const { id } = await waiting();
    await file(analyst, id, 'D-0000-0000-F1').expect(404);
    await file(analyst, id, (await buildFraction()).code).expect(404);
    await analyst.post(`/api/v1/tray/${id}/file`).send({}).expect(422);
    const elsewhere = await buildGroup();
    const stranger = await buildUser({ group: elsewhere, roles: ['analyst'] });
    const outside = await signedIn({ email: stranger.email, password: stranger.plainPassword });
    const own = await buildFraction({ run: await buildRun({ group: elsewhere }) });
    await file(outside, id, own.code).expect(404);
    expect((await outside.get('/api/v1/tray').expect(200)).body.items).toEqual([]);
    const pi = await buildUser({ group, roles: ['pi'] });
    const reader = await signedIn({ email: pi.email, password: pi.plainPassword });
    await reader.get('/api/v1/tray').expect(403);
    await file(reader, id, fraction.code).expect(403);
    await token.get('/api/v1/tray').expect(403);
    await file(token, id, fraction.code).expect(403);
  });
});
