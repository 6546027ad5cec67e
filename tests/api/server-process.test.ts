import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { request } from 'node:http';
import { afterAll, afterEach, describe, expect, it } from 'vitest';
import { buildFraction, buildGroup, buildRun, buildToken, buildUser } from '../factories/records';
import { stopTestServer } from '../support/test-server';

const children: ChildProcess[] = [];
afterEach(() => children.splice(0).forEach((child) => child.exitCode === null && child.kill('SIGKILL')));
afterAll(stopTestServer);

/** The process behind `npm start`, on a free port; resolves with its port, or with its words when it refuses. */
async function serve(
  env: Record<string, string>,
): Promise<{ child: ChildProcess; port?: number; said: string }> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'lib/server/serve.ts'], {
    env: { ...process.env, NODE_ENV: 'production', PORT: '0', LOG_LEVEL: 'info', ...env },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  children.push(child);
  let said = '';
  child.stdout!.on('data', (text: Buffer) => (said += text));
  child.stderr!.on('data', (text: Buffer) => (said += text));
  const ready = new Promise<number | undefined>((resolve) => {
    child.on(
      'message',
      (message: { ready?: boolean; port?: number }) => message.ready && resolve(message.port),
    );
    child.once('exit', () => resolve(undefined));
  });
  const port = await ready;
  return { child, port, said };
}

/** Sends `bytes` as evidence, the second half only when `release` resolves. */
async function uploadSlowly(
  port: number,
  token: string,
  code: string,
  bytes: Buffer,
  release: Promise<void>,
): Promise<number> {
  const call = request({
    port,
    host: '127.0.0.1',
    method: 'POST',
    path: `/api/v1/evidence?fraction=${code}&kind=document`,
    headers: {
      authorization: `Bearer ${token}`,
      'content-type': 'text/plain',
      'x-filename': 'slow.txt',
      'content-length': bytes.length,
    },
  });
  const answered = once(call, 'response');
  call.write(bytes.subarray(0, bytes.length / 2));
  await release;
  call.end(bytes.subarray(bytes.length / 2));
  const [response] = (await answered) as [{ statusCode: number; resume: () => void }];
  response.resume();
  return response.statusCode;
}

describe('the server process', () => {
  it('finishes an upload that is under way when it is told to stop, and takes no new request', async () => {
    const group = await buildGroup();
    const chemist = await buildUser({ group, roles: ['chemist'] });
    const fraction = await buildFraction({ run: await buildRun({ group, chemist }) });
    const { token } = await buildToken({ group });
    const { child, port, said } = await serve({});
    expect(port, said).toBeGreaterThan(0);
    let release = () => {};
    const held = new Promise<void>((resolve) => (release = resolve));
    const upload = uploadSlowly(
      port!,
      token,
      fraction.code,
      Buffer.from('Retention notes, invented.\n'.repeat(4000)),
      held,
    );
    await new Promise((resolve) => setTimeout(resolve, 500));
    const exited = once(child, 'exit');
    child.kill('SIGTERM');
    await new Promise((resolve) => setTimeout(resolve, 300));
    await expect(fetch(`http://127.0.0.1:${port}/api/health`)).rejects.toThrow();
    release();
    expect(await upload).toBe(201);
    expect((await exited)[0]).toBe(0);
  });

  it('refuses to serve in production with a session secret that anybody can read', async () => {
    const { port, said } = await serve({
      HEARTCUT_DEMO: '0',
      NEXTAUTH_SECRET: 'demo-secret-demo-secret-demo-secret-1',
    });
    expect(port).toBeUndefined();
    expect(said).toContain('NEXTAUTH_SECRET is a demo value');
  });

  it('refuses to serve in production while a demo account has its published password', async () => {
    const { port, said } = await serve({ HEARTCUT_DEMO: '0' });
    expect(port).toBeUndefined();
    expect(said).toMatch(/still has its published password/);
  });

  it('says which settings are missing', async () => {
    const { port, said } = await serve({ S3_ENDPOINT: '', DATABASE_USER: '' });
    expect(port).toBeUndefined();
    expect(said).toMatch(/S3_ENDPOINT[\s\S]*\.env\.example|\.env\.example[\s\S]*S3_ENDPOINT/);
  });
});
