import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT } from './places.mjs';

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

/**
 * Runs a command in the project's folder with the terminal's own output. Throws when it does not end with 0.
 * @param {string} command
 * @param {string[]} args
 * @param {Record<string, string | undefined>} env
 */
export async function runCommand(command, args, env = process.env) {
  const code = await runForCode(command, args, env);
  if (code !== 0)
    throw new Error(`"${[command, ...args].join(' ')}" ended with ${code}. Its output above says why.`);
}

/**
 * Like runCommand, but answers the exit code (128 when a signal ended it).
 * @param {string} command
 * @param {string[]} args
 * @param {Record<string, string | undefined>} env
 * @returns {Promise<number>}
 */
export function runForCode(command, args, env = process.env) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd: ROOT, env, stdio: 'inherit' });
    running.add(child);
    child.once('error', (error) => {
      running.delete(child);
      reject(error);
    });
    child.once('exit', (code) => {
      running.delete(child);
      resolve(code ?? 128);
    });
  });
}

/** Passes a signal on to the commands that run, for when only this process got it. */
export function stopCommands() {
  for (const child of running) child.kill('SIGTERM');
}

/** Runs a TypeScript file of the project. @param {string[]} args @param {Record<string, string | undefined>} env */
export const runTypeScript = (args, env) => runCommand(process.execPath, ['--import', 'tsx', ...args], env);

/**
 * The full path of a program, or null. /usr/sbin is not on everybody's path, yet mariadbd lives there.
 * @param {string} name
 */
export function findProgram(name) {
  const folders = [
    ...(process.env.PATH ?? '').split(':'),
    '/usr/sbin',
    '/usr/bin',
    '/usr/local/sbin',
    '/usr/local/bin',
  ];
  return folders.map((folder) => join(folder || '.', name)).find((path) => existsSync(path)) ?? null;
}
