import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, it } from 'vitest';
import { withLock } from './lock.mjs';
import { identify, isAlive, stopProcess } from './processes.mjs';

const folder = mkdtempSync(join(tmpdir(), 'heartcut-lock-'));
const path = join(folder, 'a.lock');
afterAll(() => rmSync(folder, { recursive: true }));

const sleeper = () => {
  const child = spawn(process.execPath, ['-e', 'setTimeout(() => {}, 60000)']);
  return { child, identity: identify(child.pid!) };
};

it('lets one in at a time and leaves no file', async () => {
  let [inside, most] = [0, 0];
  const enter = () =>
    withLock(path, { what: 'A test', patienceMs: 10_000 }, async () => {
      most = Math.max(most, ++inside);
      await new Promise((resolve) => setTimeout(resolve, 20));
      inside -= 1;
    });
  await Promise.all([enter(), enter(), enter()]);
  expect(most).toBe(1);
  expect(existsSync(path)).toBe(false);
});

it('names the holder when it does not want to wait', async () => {
  const { child, identity } = sleeper();
  writeFileSync(path, JSON.stringify(identity));
  const attempt = withLock(path, { what: 'Another npm test', patienceMs: 0 }, async () => 'in');
  await expect(attempt).rejects.toThrow(`Another npm test is going on already (process ${child.pid})`);
  await stopProcess(identity);
  expect(await withLock(path, { what: 'Another npm test', patienceMs: 0 }, async () => 'in')).toBe('in');
});

it('takes over the lock of a dead process, also when its number is used again or the file was cut off', async () => {
  const enter = () => withLock(path, { what: 'A test', patienceMs: 1_000 }, async () => 'in');
  writeFileSync(path, JSON.stringify({ pid: process.pid, startToken: 'of an earlier process' }));
  expect(await enter()).toBe('in');
  writeFileSync(path, '{"pid": 12');
  expect(await enter()).toBe('in');
});

it('sees that a process has ended and stops one that ignores SIGTERM', async () => {
  const child = spawn(process.execPath, [
    '-e',
    "process.on('SIGTERM', () => {}); setInterval(() => {}, 1000); console.log('up')",
  ]);
  await once(child.stdout, 'data');
  const identity = identify(child.pid!);
  expect(isAlive(identity)).toBe(true);
  await stopProcess(identity, 200);
  expect(isAlive(identity)).toBe(false);
  expect(child.signalCode ?? (await once(child, 'exit'))[1]).toBe('SIGKILL');
});
