import { randomBytes } from 'node:crypto';
import { relative } from 'node:path';
import { ensureBuild } from './build.mjs';
import { migrateDatabase } from './database-content.mjs';
import { runTypeScript } from './commands.mjs';
import { buildEnvironment, SERVICE_VARIABLES } from './environment.mjs';
import { createDatabase, dropDatabase, listDatabases } from './mariadb/accounts.mjs';
import { ROOT } from './places.mjs';
import { readSecrets } from './secrets.mjs';
import { ensureServices } from './services.mjs';

const PREFIX = 'heartcut_test_';

/**
 * Private services, a fresh migrated and seeded database and a finished build, for tests and benchmarks. Variables
 * that point the app elsewhere are ignored: a test never writes to a real service. The caller holds the home's lock.
 * @param {string} home
 */
export async function prepareTestBed(home) {
  const base = { ...process.env };
  for (const name of [...SERVICE_VARIABLES, 'NEXTAUTH_URL', 'NEXTAUTH_SECRET', 'PORT', 'HOST', 'NODE_ENV'])
    delete base[name];
  const facts = await ensureServices({ home, hold: true, allowFaults: true, environment: base });
  const access = { socket: facts.mariadb?.socket ?? '', password: readSecrets(home).databaseRootPassword };
  // Left by runs that were killed; none runs now, since the lock is ours.
  for (const name of await listDatabases(access, PREFIX)) await dropDatabase(access, name);
  const databaseName = `${PREFIX}${randomBytes(4).toString('hex')}`;
  await createDatabase(access, databaseName);
  const env = {
    ...buildEnvironment(facts, { port: 3000, databaseName, base }),
    LOG_LEVEL: base.LOG_LEVEL ?? 'warn',
    HEARTCUT_INBOX_URL: `http://127.0.0.1:${facts.mail?.inboxPort}`,
  };
  await migrateDatabase(env);
  await runTypeScript(['seeders/run.ts'], env);
  // Next builds only inside the project.
  const inside = relative(ROOT, home).startsWith('..') ? '.local-test' : relative(ROOT, home);
  const folder = await ensureBuild(['.next', `${inside}/next`], env);
  return {
    env: { ...env, HEARTCUT_DIST: folder },
    dropOwnDatabase: () => dropDatabase(access, databaseName),
  };
}
