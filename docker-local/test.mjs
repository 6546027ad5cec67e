import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { runForCode } from './commands.mjs';
import { installDependencies } from './install-dependencies.mjs';
import { findJson } from './json-file.mjs';
import { withLock } from './lock.mjs';
import { homeFolder, ROOT } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { releaseServices } from './services.mjs';
import { requireChromium } from './system-packages.mjs';
import { prepareTestBed } from './test-bed.mjs';
import { countResults } from './test-results.mjs';

const home = homeFolder('.local-test');
const args = process.argv.slice(2);
let held = false;
/** @type {() => Promise<void>} */
let dropOwnDatabase = async () => undefined;
/** @type {string} */
let lastLine = '0 passed, 1 failed';

/** The projects named on the command line; all when none is. */
function listProjects() {
  const named = args.flatMap((argument, index) => {
    if (argument === '--project') return [args[index + 1] ?? ''];
    return argument.startsWith('--project=') ? [argument.slice('--project='.length)] : [];
  });
  return named.length > 0 ? named : ['unit', 'api', 'browser'];
}

/** @param {Promise<void>} stop */
async function runTests(stop) {
  const projects = listProjects();
  let stopped = false;
  void stop.then(() => (stopped = true));
  // Tests of pure code need neither services nor a build.
  const alone = projects.every((project) => project === 'unit');
  /** @type {Record<string, string | undefined>} */
  let env = { ...process.env, NEXT_TELEMETRY_DISABLED: '1' };
  if (!alone) {
    if (projects.includes('browser')) await requireChromium();
    held = true;
    const bed = await prepareTestBed(home);
    env = bed.env;
    dropOwnDatabase = bed.dropOwnDatabase;
  }
  if (stopped) return 1;
  const output = join(home, 'results.json');
  rmSync(output, { force: true });
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${output}`];
  const code = await runForCode(
    process.execPath,
    ['node_modules/vitest/vitest.mjs', 'run', ...reporters, ...args],
    {
      ...env,
      AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
    },
  );
  const { passed, failed, skipped } = countResults(findJson(output), code, ROOT);
  lastLine = `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
  return failed > 0 ? 1 : code;
}

await runUntilStopped({
  async work(stop) {
    await installDependencies();
    mkdirSync(home, { recursive: true });
    return withLock(join(home, 'test.lock'), { what: 'Another npm test', patienceMs: 0 }, async () => {
      try {
        return await runTests(stop);
      } finally {
        await dropOwnDatabase().catch((error) => console.error(error.message));
        if (held) await releaseServices(home);
      }
    });
  },
  cleanUp: async () => console.log(lastLine),
});
