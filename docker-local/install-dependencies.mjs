import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { runCommand } from './commands.mjs';
import { findJson } from './json-file.mjs';
import { withLock } from './lock.mjs';
import { ROOT } from './places.mjs';

const OLDEST_NODE = [20, 19];

/** Throws, saying what to install, when this Node is too old. */
export function requireNodeVersion() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const [wantedMajor = 0, wantedMinor = 0] = OLDEST_NODE;
  if (major < wantedMajor || (major === wantedMajor && minor < wantedMinor)) {
    throw new Error(
      `Heartcut needs Node ${OLDEST_NODE.join('.')} or newer; this is ${process.versions.node}. Install it from https://nodejs.org`,
    );
  }
}

/**
 * Whether node_modules holds exactly what package-lock.json asks for. npm writes its own record last, so an
 * interrupted installation has none. Compared by content: a fresh checkout makes files newer without a change.
 */
function isInstalled() {
  const wanted = findJson(join(ROOT, 'package-lock.json'))?.packages ?? {};
  const present = findJson(join(ROOT, 'node_modules', '.package-lock.json'))?.packages;
  if (!present) return false;
  const same = Object.entries(wanted).every(([path, entry]) => {
    if (path === '') return true;
    const found = present[path];
    if (!found) return Boolean(entry.optional || entry.devOptional);
    return (
      found.version === entry.version && found.integrity === entry.integrity && existsSync(join(ROOT, path))
    );
  });
  return same && Object.keys(present).every((path) => path in wanted);
}

/** Runs `npm ci` when needed, development packages included: the build and the command line tools need them. */
export async function installDependencies() {
  requireNodeVersion();
  if (isInstalled()) return;
  await withLock(
    join(ROOT, '.local', 'install.lock'),
    { what: 'Installing the dependencies', patienceMs: 600_000 },
    async () => {
      if (isInstalled()) return;
      console.log('Installing the dependencies (npm ci) ...');
      await runCommand('npm', ['ci', '--include=dev', '--no-audit', '--no-fund']);
    },
  );
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  await installDependencies().catch((error) => {
    console.error(error.message);
    process.exitCode = 1;
  });
}
