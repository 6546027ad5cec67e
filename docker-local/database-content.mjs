import { join } from 'node:path';
import { runTypeScript } from './commands.mjs';
import { findJson, writeJson } from './json-file.mjs';
import { withLock } from './lock.mjs';

/** Brings the database named in `env` to the present schema. @param {Record<string, string | undefined>} env */
export const migrateDatabase = (env) => runTypeScript(['migrations/run.ts', 'up'], env);

/** @param {string} home */
const seededPath = (home) => join(home, 'seeded.json');

/**
 * Migrates, and fills the demo laboratory once a database. The note is written after the seeders end, so an
 * interrupted one runs again; seeders leave alone what is there.
 * @param {string} home
 * @param {Record<string, string | undefined>} env
 */
export async function migrateAndSeed(home, env) {
  await withLock(join(home, 'database.lock'), { what: 'Migrating', patienceMs: 300_000 }, async () => {
    await migrateDatabase(env);
    const name = `${env.DATABASE_HOST}:${env.DATABASE_NAME}`;
    const seeded = findJson(seededPath(home)) ?? {};
    if (seeded[name]) return;
    console.log('Seeding the demo laboratory ...');
    await runTypeScript(['seeders/run.ts'], env);
    writeJson(seededPath(home), { ...seeded, [name]: new Date().toISOString() });
  });
}

/** Forgets that a database was seeded, after it was emptied. @param {string} home */
export const forgetSeeded = (home) => writeJson(seededPath(home), {});
