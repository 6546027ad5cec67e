import { forgetSeeded, migrateAndSeed } from './database-content.mjs';
import { buildEnvironment } from './environment.mjs';
import { readWantedAddress } from './free-port.mjs';
import { listHolders } from './holders.mjs';
import { installDependencies } from './install-dependencies.mjs';
import { createDatabase, dropDatabase } from './mariadb/accounts.mjs';
import { homeFolder } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { readSecrets } from './secrets.mjs';
import { ensureServices, releaseServices } from './services.mjs';

const home = homeFolder();
let held = false;

await runUntilStopped({
  async work() {
    if (!process.argv.includes('--yes')) {
      throw new Error(
        `This empties the local database in ${home} and seeds it anew. Stored files stay.\nIf you mean it: npm run db:reset -- --yes`,
      );
    }
    if (process.env.DATABASE_HOST)
      throw new Error('DATABASE_HOST is set: only the local database can be reset. Unset it first.');
    const users = listHolders(home).filter((holder) => holder !== 'services:up');
    if (users.length > 0) throw new Error(`Process ${users.join(', ')} uses the database. Stop it first.`);
    await installDependencies();
    held = true;
    const facts = await ensureServices({ home, hold: true });
    const access = { socket: facts.mariadb?.socket ?? '', password: readSecrets(home).databaseRootPassword };
    forgetSeeded(home);
    await dropDatabase(access, 'heartcut');
    await createDatabase(access, 'heartcut');
    await migrateAndSeed(home, buildEnvironment(facts, readWantedAddress()));
    return 0;
  },
  cleanUp: async () => {
    if (held) await releaseServices(home);
  },
});
