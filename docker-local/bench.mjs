import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { runTypeScript } from './commands.mjs';
import { installDependencies } from './install-dependencies.mjs';
import { withLock } from './lock.mjs';
import { homeFolder } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { releaseServices } from './services.mjs';
import { prepareTestBed } from './test-bed.mjs';

const home = homeFolder('.local-test');
let held = false;
/** @type {() => Promise<void>} */
let dropOwnDatabase = async () => undefined;

await runUntilStopped({
  async work() {
    await installDependencies();
    mkdirSync(home, { recursive: true });
    return withLock(join(home, 'test.lock'), { what: 'Another npm test', patienceMs: 0 }, async () => {
      try {
        held = true;
        const bed = await prepareTestBed(home);
        dropOwnDatabase = bed.dropOwnDatabase;
        await runTypeScript(['tests/bench/run.ts', ...process.argv.slice(2)], {
          ...bed.env,
          NODE_ENV: 'production',
        });
        return 0;
      } finally {
        await dropOwnDatabase().catch((error) => console.error(error.message));
        if (held) await releaseServices(home);
      }
    });
  },
  cleanUp: async () => undefined,
});
