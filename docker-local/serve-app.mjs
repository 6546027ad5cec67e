import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { ROOT } from './places.mjs';
import { identify, stopProcess } from './processes.mjs';

/** Longer than the server's own time for requests under way. */
const STOP_PATIENCE_MS = 20_000;

/**
 * Starts a Node program of the app in a process group of its own, so that Ctrl-C reaches this process alone and
 * the order of stopping stays ours; should this process die, the program ends by itself.
 * @param {string[]} args
 * @param {Record<string, string | undefined>} env
 */
export function serveApp(args, env) {
  const preload = ['--import', join(ROOT, 'docker-local', 'end-with-parent.mjs')];
  const child = spawn(process.execPath, [...preload, ...args], {
    cwd: ROOT,
    env: { ...env, HEARTCUT_STARTED_BY: String(process.pid) },
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  if (child.pid === undefined) throw new Error('The app could not be started.');
  const identity = identify(child.pid);
  const exited = new Promise((/** @type {(code: number) => void} */ resolve) =>
    child.once('exit', (code) => resolve(code ?? 1)),
  );
  const ready = new Promise((/** @type {(port: number) => void} */ resolve) => {
    child.on('message', (/** @type {{ ready?: boolean, port?: number }} */ message) => {
      if (message?.ready) resolve(Number(message.port));
    });
  });
  return { pid: child.pid, exited, ready, stop: () => stopProcess(identity, STOP_PATIENCE_MS) };
}
