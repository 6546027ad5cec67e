import { mkdirSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { findJson, writeJson } from './json-file.mjs';
import { identify, isAlive } from './processes.mjs';

/**
 * Who wants the services of a home folder up: a running process, or `keep` (services:up). One small file each, so
 * that a killed process is noticed and forgotten.
 * @param {string} home
 * @param {'process' | 'keep'} kind
 */
const holderPath = (home, kind) => join(home, 'holders', `${kind === 'keep' ? 'keep' : process.pid}.json`);

/** @param {string} home @param {'process' | 'keep'} kind */
export function addHolder(home, kind) {
  writeJson(holderPath(home, kind), kind === 'keep' ? { keep: true } : identify(process.pid));
}

/** @param {string} home @param {'process' | 'keep'} kind */
export function removeHolder(home, kind) {
  rmSync(holderPath(home, kind), { force: true });
}

/**
 * The living holders, as pids or "services:up"; files of dead ones are removed.
 * @param {string} home
 * @returns {string[]}
 */
export function listHolders(home) {
  const folder = join(home, 'holders');
  mkdirSync(folder, { recursive: true });
  return readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .flatMap((name) => {
      const holder = findJson(join(folder, name));
      if (holder?.keep) return ['services:up'];
      if (isAlive(holder)) return [String(holder.pid)];
      rmSync(join(folder, name), { force: true });
      return [];
    });
}
