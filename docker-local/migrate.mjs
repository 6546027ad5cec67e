import { migrateDatabase } from './database-content.mjs';
import { buildEnvironment } from './environment.mjs';
import { readWantedAddress } from './free-port.mjs';
import { installDependencies } from './install-dependencies.mjs';
import { homeFolder } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { ensureServices, releaseServices } from './services.mjs';

const home = homeFolder();
let held = false;

await runUntilStopped({
  async work() {
    await installDependencies();
    held = true;
    const facts = await ensureServices({ home, hold: true });
    await migrateDatabase(buildEnvironment(facts, readWantedAddress()));
    return 0;
  },
  cleanUp: async () => {
    if (held) await releaseServices(home);
  },
});
