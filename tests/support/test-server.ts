import { createHash, randomBytes } from 'node:crypto';
import request from 'supertest';
import { closeDatabase } from '@/lib/database/connection';
import { type HeartcutServer, startHttpServer } from '@/lib/server/http-server';

let server: HeartcutServer | undefined;

/** The real app, from the finished build, on a free loopback port; the same one for a whole test file. */
export async function testServer(): Promise<HeartcutServer> {
  if (!server) {
    // HEARTCUT_TEST_DEV=1 compiles on demand, for work on one test; the full run uses the finished build.
    const dev = process.env.HEARTCUT_TEST_DEV === '1';
    server = await startHttpServer({ port: 0, host: '127.0.0.1', dir: process.cwd(), dev });
    process.env.NEXTAUTH_URL = `http://127.0.0.1:${server.port}`;
    server.url = process.env.NEXTAUTH_URL;
  }
  return server;
}

export async function stopTestServer(): Promise<void> {
  await server?.close(1_000);
  server = undefined;
  await closeDatabase();
}

export type Agent = ReturnType<typeof request.agent>;

/** Somebody without an account. Unsafe calls carry our own Origin, as a page's script would. */
export async function anonymous(): Promise<Agent> {
  const { url } = await testServer();
  return request.agent(url).set('Origin', url);
}

/** Signs in the way a program does: next-auth's csrf token, then its credentials callback. */
export async function signedIn({ email, password }: { email: string; password: string }): Promise<Agent> {
  const agent = await anonymous();
  const { body } = await agent.get('/api/auth/csrf').expect(200);
  await agent
    .post('/api/auth/callback/credentials')
    .type('form')
    .send({ email, password, csrfToken: body.csrfToken, json: 'true' });
  return agent;
}

/** A caller with an access token instead of a session. */
export async function withToken(token: string): Promise<Agent> {
  const { url } = await testServer();
  return request.agent(url).set('Authorization', `Bearer ${token}`);
}

export function sha256(bytes: Buffer | string): string {
  return createHash('sha256').update(bytes).digest('hex');
}

export function unique(prefix: string): string {
  return `${prefix}-${randomBytes(5).toString('hex')}`;
}
