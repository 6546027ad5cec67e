import { request } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';
import { chooseFreePort } from '../../docker-local/free-port.mjs';
import { serveApp } from '../../docker-local/serve-app.mjs';

const patienceMs = 60_000;
const firstPort = 3600;

export interface AppProcess {
  pid: number;
  url: string;
  /** From the start of the process to the first 200 of GET /api/health. */
  readyAfterMs: number;
  stop(): Promise<unknown>;
}

/** The status of a GET on a connection of its own; 0 when nobody listens. */
function statusOf(url: string): Promise<number> {
  return new Promise((resolve) => {
    const call = request(url, { agent: false, timeout: 5_000 }, (response) => {
      response.resume();
      response.once('end', () => resolve(response.statusCode ?? 0));
      response.once('error', () => resolve(0));
    });
    call.once('error', () => resolve(0));
    call.once('timeout', () => call.destroy());
    call.end();
  });
}

/** Starts a Node program as the app is started and waits for the first 200 of `path`; throws after a minute. */
async function startProgram(args: string[], path: string): Promise<AppProcess> {
  const port = await chooseFreePort(firstPort, '127.0.0.1');
  const url = `http://127.0.0.1:${port}`;
  const started = performance.now();
  const child = serveApp(args, {
    ...process.env,
    NODE_ENV: 'production',
    HOST: '127.0.0.1',
    PORT: String(port),
    NEXTAUTH_URL: url,
  });
  let ended: number | undefined;
  void child.exited.then((code) => (ended = code));
  while ((await statusOf(url + path)) !== 200) {
    if (ended !== undefined) throw new Error(`The program ended with ${ended} before it was ready.`);
    if (performance.now() - started > patienceMs) {
      await child.stop();
      throw new Error(`The program did not answer ${path} with 200 within ${patienceMs / 1000} s.`);
    }
    await wait(5);
  }
  return { pid: child.pid, url, readyAfterMs: performance.now() - started, stop: child.stop };
}

/** The app from its finished build, in a process of its own. */
export function startApp(): Promise<AppProcess> {
  return startProgram(['--import', 'tsx', 'lib/server/serve.ts'], '/api/health');
}

const bareServer = `require('node:http').createServer((_, response) => response.end('ok')).listen(process.env.PORT, process.env.HOST)`;

/** The least that any web server of Node costs: a process that answers everything with "ok". */
export function startBareServer(): Promise<AppProcess> {
  return startProgram(['-e', bareServer], '/');
}
