import { afterAll, describe, expect, it } from 'vitest';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { OutboxMessage, PasswordReset } from '@/lib/database/records';
import { signIn } from '@/lib/accounts/sign-in';
import { buildGroup, buildUser } from '../factories/records';
import { anonymous, signedIn, stopTestServer, unique, withToken } from '../support/test-server';

afterAll(stopTestServer);

async function administrator() {
  const user = await buildUser({ isAdmin: true });
  return { user, agent: await signedIn({ email: user.email, password: user.plainPassword }) };
}

describe('accounts', () => {
  it('must change the first password before anything else', async () => {
    const { agent } = await administrator();
    const group = await buildGroup();
    const email = `${unique('new')}@heartcut.example`;
    const { body } = await agent
      .post('/api/v1/admin/users')
      .send({ email, name: 'Nadia Ferrer', memberships: [{ group: group.id, role: 'chemist' }] })
      .expect(201);
    const theirs = await signedIn({ email, password: body.firstPassword });
    expect((await theirs.get('/api/v1/me').expect(200)).body.mustChangePassword).toBe(true);
    const refused = await theirs.get('/api/v1/runs').expect(403);
    expect(refused.body.title).toBe('Change your password first');
    await theirs
      .post('/api/v1/account/password')
      .send({ currentPassword: body.firstPassword, newPassword: 'short' })
      .expect(422);
    await theirs
      .post('/api/v1/account/password')
      .send({ currentPassword: body.firstPassword, newPassword: 'juniper-berries-by-steam' })
      .expect(204);
    // Every sign-in of the account has ended, this one too.
    await theirs.get('/api/v1/me').expect(401);
    const again = await signedIn({ email, password: 'juniper-berries-by-steam' });
    await again.get('/api/v1/runs').expect(200);
  });

  it('lose a right at the next click when an administrator takes it away', async () => {
    const { agent } = await administrator();
    const group = await buildGroup();
    const user = await buildUser({ group, roles: ['pi'] });
    const theirs = await signedIn({ email: user.email, password: user.plainPassword });
    await theirs.get('/api/v1/audit').expect(200);
    const change = { memberships: [], reason: 'left the group' };
    await agent.patch(`/api/v1/admin/users/${user.id}`).send(change).expect(428);
    await agent.patch(`/api/v1/admin/users/${user.id}`).set('If-Match', '"0"').send(change).expect(200);
    await agent.patch(`/api/v1/admin/users/${user.id}`).set('If-Match', '"0"').send(change).expect(409);
    await theirs.get('/api/v1/audit').expect(403);
    await agent
      .patch(`/api/v1/admin/users/${user.id}`)
      .set('If-Match', '"1"')
      .send({ disabled: true, reason: 'left the site' })
      .expect(200);
    await theirs.get('/api/v1/me').expect(401);
  });

  it('are locked for a while, for the address that failed, and say nothing about it', async () => {
    const user = await buildUser();
    for (let i = 0; i < 5; i++) await signedIn({ email: user.email, password: 'wrong' });
    const locked = await signedIn({ email: user.email, password: user.plainPassword });
    await locked.get('/api/v1/me').expect(401);
    // The owner, at another address, is not locked out by a stranger's tries.
    expect(await signIn(user.email, user.plainPassword, '203.0.113.77')).toMatchObject({ id: user.id });
    await database().query(
      'UPDATE sign_in_throttles SET lockedUntil = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND WHERE subject LIKE ?',
      { replacements: [`account:${user.email}%`], type: QueryTypes.UPDATE },
    );
    const open = await signedIn({ email: user.email, password: user.plainPassword });
    await open.get('/api/v1/me').expect(200);
  });

  it('believe no address that the caller writes', async () => {
    const user = await buildUser();
    const agent = await anonymous();
    for (let i = 0; i < 5; i++) {
      const { body } = await agent.get('/api/auth/csrf').expect(200);
      await agent
        .post('/api/auth/callback/credentials')
        .set('X-Forwarded-For', `198.51.100.${i}`)
        .type('form')
        .send({ email: user.email, password: 'wrong', csrfToken: body.csrfToken, json: 'true' });
    }
    const locked = await signedIn({ email: user.email, password: user.plainPassword });
    await locked.get('/api/v1/me').expect(401);
  });

  it('end a sign-in for good when its person signs out, also for a copy of the cookie', async () => {
    const user = await buildUser();
    const agent = await signedIn({ email: user.email, password: user.plainPassword });
    const other = await signedIn({ email: user.email, password: user.plainPassword });
    const { headers } = await agent.get('/api/auth/session').expect(200);
    const copy = ([] as string[])
      .concat(headers['set-cookie'] ?? [])
      .find((cookie) => /session-token=/.test(cookie))!
      .split(';')[0]!;
    const nobody = await anonymous();
    await nobody.get('/api/v1/me').set('Cookie', copy).expect(200);
    const { body } = await agent.get('/api/auth/csrf').expect(200);
    await agent
      .post('/api/auth/signout')
      .type('form')
      .send({ csrfToken: body.csrfToken, json: 'true' })
      .expect(200);
    await nobody.get('/api/v1/me').set('Cookie', copy).expect(401);
    await other.get('/api/v1/me').expect(200);
  });

  it('get a reset link by mail that works once, and strangers get the same answer', async () => {
    const user = await buildUser();
    const nobody = await anonymous();
    const known = await nobody.post('/api/v1/password-resets').send({ email: user.email }).expect(202);
    const unknown = await nobody
      .post('/api/v1/password-resets')
      .send({ email: 'stranger@heartcut.example' })
      .expect(202);
    expect(known.body).toEqual(unknown.body);
    expect(await OutboxMessage.count({ where: { recipient: 'stranger@heartcut.example' } })).toBe(0);
    await nobody.post('/api/v1/password-resets').send({ email: user.email }).expect(202);
    const mail = await OutboxMessage.findOne({ where: { recipient: user.email } });
    const token = /new-password\/([\w-]+)/.exec(mail!.body)![1];
    await nobody
      .post(`/api/v1/password-resets/${token}`)
      .send({ newPassword: 'vetiver-root-at-dawn' })
      .expect(204);
    await nobody
      .post(`/api/v1/password-resets/${token}`)
      .send({ newPassword: 'vetiver-root-at-dusk' })
      .expect(422);
    // Another link that was mailed meanwhile ends with it.
    expect(await PasswordReset.count({ where: { userId: user.id, usedAt: null } })).toBe(0);
    const theirs = await signedIn({ email: user.email, password: 'vetiver-root-at-dawn' });
    await theirs.get('/api/v1/me').expect(200);
  });

  it('refuse a change that comes from another site', async () => {
    const { agent } = await administrator();
    await agent
      .post('/api/v1/admin/groups')
      .set('Origin', 'https://elsewhere.example')
      .send({ name: unique('Group') })
      .expect(403);
    await agent
      .post('/api/v1/admin/groups')
      .send({ name: unique('Group') })
      .expect(201);
  });
});

describe('instruments and tokens', () => {
  it('show a token once, keep only its digest, and refuse it after it was revoked', async () => {
    const { agent } = await administrator();
    const group = await buildGroup();
    const { body: instrument } = await agent
      .post('/api/v1/admin/instruments')
      .send({ group: group.id, name: unique('GC'), kind: 'gas chromatograph' })
      .expect(201);
    const { body: made } = await agent
      .post('/api/v1/admin/tokens')
      .send({ instrument: instrument.id, name: 'bench PC', scopes: ['evidence:write'] })
      .expect(201);
    expect(made.token).toMatch(/^hc_[\w-]{43}$/);
    const { body: list } = await agent.get('/api/v1/admin/tokens').expect(200);
    expect(JSON.stringify(list)).not.toContain(made.token);
    const dump = await database().query('SELECT * FROM access_tokens', { type: QueryTypes.SELECT });
    expect(JSON.stringify(dump)).not.toContain(made.token);
    const pc = await withToken(made.token);
    expect((await pc.get('/api/v1/me').expect(200)).body).toMatchObject({
      kind: 'token',
      scopes: ['evidence:write'],
    });
    await pc.get('/api/v1/admin/tokens').expect(403);
    await agent.delete(`/api/v1/admin/tokens/${made.id}`).expect(204);
    await pc.get('/api/v1/me').expect(401);
  });

  it('answer the same request with the same Idempotency-Key once', async () => {
    const { agent } = await administrator();
    const key = unique('key');
    const name = unique('Group');
    const first = await agent
      .post('/api/v1/admin/groups')
      .set('Idempotency-Key', key)
      .send({ name })
      .expect(201);
    const second = await agent
      .post('/api/v1/admin/groups')
      .set('Idempotency-Key', key)
      .send({ name })
      .expect(201);
    expect(second.body).toEqual(first.body);
    expect(second.headers['idempotent-replay']).toBe('true');
    await agent
      .post('/api/v1/admin/groups')
      .set('Idempotency-Key', key)
      .send({ name: unique('Other') })
      .expect(422);
  });
});
