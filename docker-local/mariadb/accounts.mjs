import { runSqlAsRoot } from './run-sql.mjs';

export const APP_ACCOUNT = 'heartcut_app';
export const MIGRATE_ACCOUNT = 'heartcut_migrate';

const NAME = /^[a-z][a-z0-9_]{0,60}$/;

/** @param {string} name */
function requireDatabaseName(name) {
  if (!NAME.test(name)) throw new Error(`"${name}" is not a database name: use a-z, 0-9 and _.`);
  return name;
}

/**
 * Makes a database that migrations own; the application's account gets its rights table by table from them.
 * `_` is escaped in the grant, where it would stand for any character.
 * @param {{ socket: string, password: string }} access
 * @param {string} name
 */
export async function createDatabase(access, name) {
  requireDatabaseName(name);
  const pattern = name.replaceAll('_', '\\_');
  await runSqlAsRoot(
    access,
    `CREATE DATABASE IF NOT EXISTS \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;
     GRANT ALL ON \`${pattern}\`.* TO '${MIGRATE_ACCOUNT}'@'%' WITH GRANT OPTION;`,
  );
}

/**
 * Takes a database away with all that is in it, and the rights on it.
 * @param {{ socket: string, password: string }} access
 * @param {string} name
 */
export async function dropDatabase(access, name) {
  requireDatabaseName(name);
  const pattern = name.replaceAll('_', '\\_');
  await runSqlAsRoot(
    access,
    `DROP DATABASE IF EXISTS \`${name}\`;
     DELETE FROM mysql.tables_priv WHERE Db = '${name}';
     DELETE FROM mysql.columns_priv WHERE Db = '${name}';
     DELETE FROM mysql.db WHERE Db = '${pattern.replaceAll('\\', '\\\\')}' OR Db = '${name}';
     FLUSH PRIVILEGES;`,
  );
}

/**
 * @param {{ socket: string, password: string }} access
 * @param {string} prefix
 * @returns {Promise<string[]>}
 */
export async function listDatabases(access, prefix) {
  const names = await runSqlAsRoot(access, 'SHOW DATABASES;');
  return names.split('\n').filter((name) => name.startsWith(prefix));
}

/**
 * Brings a fresh or older server to the wanted state: root by password and socket only, nobody without a name, and
 * the two accounts. Safe to repeat.
 * @param {string} socket
 * @param {import('../secrets.mjs').Secrets} secrets
 */
export async function prepareAccounts(socket, secrets) {
  const access = { socket, password: secrets.databaseRootPassword };
  try {
    await runSqlAsRoot(access, 'SELECT 1;');
  } catch {
    // A server that was just made has no password yet.
    const setPassword = `ALTER USER 'root'@'localhost' IDENTIFIED BY '${secrets.databaseRootPassword}';`;
    await runSqlAsRoot({ socket, password: '' }, setPassword).catch((error) => {
      throw new Error(
        `${error.message}\nsecrets.json does not fit this database. Put the right file back, or move the mariadb folder away to begin anew.`,
      );
    });
  }
  const others = await runSqlAsRoot(
    access,
    "SELECT CONCAT(QUOTE(User), '@', QUOTE(Host)) FROM mysql.user WHERE User = '' OR (User = 'root' AND Host <> 'localhost');",
  );
  const drops = others
    .split('\n')
    .filter(Boolean)
    .map((account) => `DROP USER IF EXISTS ${account};`);
  const accounts = [
    [APP_ACCOUNT, secrets.databasePassword],
    [MIGRATE_ACCOUNT, secrets.databaseMigratePassword],
  ].map(
    ([name, password]) =>
      `CREATE USER IF NOT EXISTS '${name}'@'%'; ALTER USER '${name}'@'%' IDENTIFIED BY '${password}';`,
  );
  await runSqlAsRoot(access, [...drops, ...accounts].join('\n'));
  await createDatabase(access, 'heartcut');
}
