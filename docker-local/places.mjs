import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The folder of the project. */
export const ROOT = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');

/**
 * The folder of all state: HEARTCUT_HOME, or `fallback` inside the project.
 * @param {string} fallback
 */
export function homeFolder(fallback = '.local') {
  return resolve(ROOT, process.env.HEARTCUT_HOME || fallback);
}
