import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { findJson } from './json-file.mjs';
import { identify, isAlive } from './processes.mjs';

/**
 * Puts a lock file in place, whole or not at all. False when there is one already.
 * @param {string} path
 */
function tryCreate(path) {
  const own = `${path}.${process.pid}`;
  writeFileSync(own, JSON.stringify(identify(process.pid)));
  try {
    linkSync(own, path);
    return true;
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error;
    return false;
  } finally {
    rmSync(own, { force: true });
  }
}

/**
 * Takes away the lock of a process that is dead. Moved aside first and looked at again, so that of two that try
 * only one takes it, and a lock made in between is put back.
 * @param {string} path
 */
function removeDead(path) {
  const aside = `${path}.${process.pid}.dead`;
  try {
    renameSync(path, aside);
    if (isAlive(JSON.parse(readFileSync(aside, 'utf8')))) linkSync(aside, path);
  } catch {
    // Somebody else was faster.
  }
  rmSync(aside, { force: true });
}

/**
 * Runs `action` while holding a lock file. A lock whose process is dead is taken over. When the holder lives,
 * waits up to `patienceMs`, then throws an error with the holder's pid.
 * @template Result
 * @param {string} path
 * @param {{ what: string, patienceMs: number }} options
 * @param {() => Promise<Result>} action
 * @returns {Promise<Result>}
 */
export async function withLock(path, { what, patienceMs }, action) {
  mkdirSync(dirname(path), { recursive: true });
  const until = Date.now() + patienceMs;
  while (!tryCreate(path)) {
    const holder = findJson(path);
    if (!isAlive(holder)) removeDead(path);
    else if (Date.now() >= until) {
      throw new Error(
        `${what} is going on already (process ${holder.pid}). Wait for it to end, or stop it first.`,
      );
    } else await wait(100);
  }
  try {
    return await action();
  } finally {
    rmSync(path, { force: true });
  }
}
