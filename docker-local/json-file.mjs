import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

/**
 * The content of a JSON file, or null when it is missing or was cut off.
 * @param {string} path
 * @returns {any}
 */
export function findJson(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8'));
  } catch {
    return null;
  }
}

/**
 * Writes a JSON file in one step: a reader sees the old content or the new one.
 * @param {string} path
 * @param {unknown} value
 * @param {number} mode
 */
export function writeJson(path, value, mode = 0o644) {
  mkdirSync(dirname(path), { recursive: true });
  const next = `${path}.${process.pid}.new`;
  writeFileSync(next, `${JSON.stringify(value, null, 2)}\n`, { mode });
  renameSync(next, path);
}
