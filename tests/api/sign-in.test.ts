import { afterAll, describe, expect, it } from 'vitest';
import { buildGroup, buildUser } from '../factories/records';
import { anonymous, signedIn, stopTestServer } from '../support/test-server';

afterAll(stopTestServer);

describe('signing in', () => {
  it('answers 401 with problem details to nobody', async () => {
    const agent = await anonymous();
    const answer = await agent.get('/api/v1/me').expect(401);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect(answer.body).toMatchObject({ status: 401, title: 'Sign in first' });
  });

  it('tells a person their groups and roles', async () => {
    const group = await buildGroup();
    const user = await buildUser({ group, roles: ['chemist', 'analyst'] });
    const agent = await signedIn({ email: user.email, password: user.plainPassword });
    const { body } = await agent.get('/api/v1/me').expect(200);
    expect(body.groups).toEqual([{ id: group.id, name: group.name, roles: ['chemist', 'analyst'] }]);
  });

  it('gives no session for a wrong password', async () => {
    const user = await buildUser();
    const agent = await signedIn({ email: user.email, password: 'not-the-password' });
    await agent.get('/api/v1/me').expect(401);
  });

  it('reports the health of what it leans on', async () => {
    const agent = await anonymous();
    const { body } = await agent.get('/api/health').expect(200);
    expect(body).toMatchObject({ status: 'ok', database: 'ok', storage: 'ok' });
  });
});
