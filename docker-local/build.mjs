import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { runCommand } from './commands.mjs';
import { findJson, writeJson } from './json-file.mjs';
import { withLock } from './lock.mjs';
import { ROOT } from './places.mjs';
import { identify, isAlive } from './processes.mjs';

/** What a build is made of; tests and scripts do not go into it. */
const SOURCE_FOLDERS = ['app', 'components', 'lib', 'models', 'storage', 'public'];
const SOURCE_FILES =
  /^(package-lock\.json|next\.config\.mjs|postcss\.config\.mjs|tailwind\.config\.ts|tsconfig\.json|proxy\.ts|instrumentation\.ts)$/;

/**
 * @param {string} folder
 * @returns {string[]}
 */
function listFiles(folder) {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return listFiles(path);
    return /\.test\.tsx?$/.test(entry.name) ? [] : [path];
  });
}

/** A digest of names and contents: touching a file does not cause a build, changing one does. */
function digestSources() {
  const files = readdirSync(ROOT)
    .filter((name) => SOURCE_FILES.test(name))
    .map((name) => join(ROOT, name));
  const all = [...files, ...SOURCE_FOLDERS.flatMap((name) => listFiles(join(ROOT, name)))].sort();
  const hash = createHash('sha256').update(process.versions.node);
  for (const path of all) hash.update(`\0${relative(ROOT, path)}\0`).update(readFileSync(path));
  return hash.digest('hex');
}

/** @param {string} folder */
const stampPath = (folder) => join(ROOT, folder, 'heartcut-build-stamp');
/** @param {string} folder */
const servingPath = (folder) => join(ROOT, folder, 'heartcut-serving.json');

/** @param {string} folder @param {string} digest */
const isFresh = (folder, digest) =>
  existsSync(join(ROOT, folder, 'BUILD_ID')) &&
  existsSync(stampPath(folder)) &&
  readFileSync(stampPath(folder), 'utf8') === digest;

/** @param {string} folder */
const isServed = (folder) => isAlive(findJson(servingPath(folder)));

/** Notes that a process serves from a build folder, so that nobody builds over it. @param {string} folder @param {number} pid */
export const markServed = (folder, pid) => writeJson(servingPath(folder), identify(pid));

/**
 * Makes sure a finished build of the present sources exists and answers its folder, relative to the project: the
 * first of `folders` that is fresh, or else the first that no running app serves from.
 * @param {string[]} folders
 * @param {Record<string, string | undefined>} env
 * @returns {Promise<string>}
 */
export async function ensureBuild(folders, env) {
  return withLock(join(ROOT, '.local', 'build.lock'), { what: 'A build', patienceMs: 600_000 }, async () => {
    const digest = digestSources();
    const fresh = folders.find((folder) => isFresh(folder, digest));
    if (fresh) return fresh;
    const folder = folders.find((candidate) => !isServed(candidate));
    if (!folder) {
      throw new Error(
        'The sources have changed, but a running app serves the present build. Stop it, then start again.',
      );
    }
    console.log('Building the app ...');
    rmSync(stampPath(folder), { force: true });
    const tsconfig = join(ROOT, 'tsconfig.json');
    const before = readFileSync(tsconfig, 'utf8');
    try {
      const args = ['node_modules/next/dist/bin/next', 'build'];
      await runCommand(process.execPath, args, { ...env, NODE_ENV: 'production', HEARTCUT_DIST: folder });
    } finally {
      // A build into another folder than usual writes that folder into tsconfig.json, which is not its place.
      if (readFileSync(tsconfig, 'utf8') !== before) writeFileSync(tsconfig, before);
    }
    writeFileSync(stampPath(folder), digest);
    return folder;
  });
}
