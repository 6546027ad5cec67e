import { readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import mariadb from 'mariadb';
import { QueryTypes, Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { env } from '@/lib/env';

/** A migration gets a function that runs one SQL statement. There is no way down: data is never dropped. */
export type Migration = (run: (sql: string) => Promise<unknown>) => Promise<void>;

/** Tables on which the application may only add and read: history stays as it was written. */
const appendOnly = new Set([
  'audit_events',
  'verdicts',
  'integrations',
  'peaks',
  'refractive_readings',
  'fraction_transitions',
  'log_readings',
]);

/** The few tables whose rows may go: links that are re-drawn, and rows that only live for a while. */
const removable = new Set([
  'memberships',
  'compound_synonyms',
  'run_impurities',
  'plate_lanes',
  'plate_spots',
  'sign_in_throttles',
  'ended_sessions',
  'idempotency_keys',
]);

const here = dirname(fileURLToPath(import.meta.url));

function connect(): Sequelize {
  const { host, port, name, migrateUser, migratePassword } = env().database;
  return new Sequelize(name, migrateUser, migratePassword, {
    dialect: 'mariadb',
    dialectModule: mariadb,
    host,
    port,
    logging: false,
    dialectOptions: { collation: 'utf8mb4_unicode_ci' },
  });
}

/** Gives the application's account what it needs, table by table, and no more. */
async function grantApplicationRights(sequelize: Sequelize): Promise<void> {
  const { name, user, migrateUser } = env().database;
  if (user === migrateUser) return;
  const tables = await sequelize.query<{ name: string }>(
    'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = :name',
    { replacements: { name }, type: QueryTypes.SELECT },
  );
  const account = `${sequelize.escape(user)}@'%'`;
  for (const table of tables) {
    if (table.name === 'migrations') continue;
    const rights = ['SELECT', 'INSERT'];
    if (!appendOnly.has(table.name)) rights.push('UPDATE');
    if (removable.has(table.name)) rights.push('DELETE');
    await sequelize.query(`GRANT ${rights.join(', ')} ON \`${name}\`.\`${table.name}\` TO ${account}`);
  }
}

/** Runs what is pending, oldest first, and returns the names of the migrations that ran. */
export async function migrate(): Promise<string[]> {
  const sequelize = connect();
  try {
    const files = readdirSync(here)
      .filter((file) => /^\d{8}-.*\.ts$/.test(file))
      .sort();
    const umzug = new Umzug({
      migrations: files.map((file) => ({
        name: file,
        up: async () => {
          const { up } = (await import(join(here, file))) as { up: Migration };
          await up((sql) => sequelize.query(sql));
        },
      })),
      storage: new SequelizeStorage({ sequelize, tableName: 'migrations', modelName: 'migration' }),
      logger: undefined,
    });
    const done = await umzug.up();
    await grantApplicationRights(sequelize);
    return done.map((migration) => migration.name);
  } finally {
    await sequelize.close();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const done = await migrate();
  console.log(done.length === 0 ? 'The database is up to date.' : `Migrated: ${done.join(', ')}`);
}
