import mariadb from 'mariadb';
import { Sequelize } from 'sequelize';
import { guardWrites } from '@/lib/audit/write-guard';
import { env } from '@/lib/env';

// Next.js evaluates modules once per bundle; one pool a process needs a place outside them.
const store = globalThis as { heartcutSequelize?: Sequelize };

function connect(): Sequelize {
  const { host, port, name, user, password } = env().database;
  const sequelize = new Sequelize(name, user, password, {
    dialect: 'mariadb',
    dialectModule: mariadb,
    host,
    port,
    logging: false,
    timezone: '+00:00',
    pool: { max: 12, min: 1, acquire: 8_000, idle: 30_000 },
    define: { charset: 'utf8mb4', collate: 'utf8mb4_unicode_ci' },
    dialectOptions: {
      connectTimeout: 3_000,
      // Connector and Sequelize both want to parse JSON; the models do it in one place.
      autoJsonMap: false,
      collation: 'utf8mb4_unicode_ci',
    },
  });
  guardWrites(sequelize);
  return sequelize;
}

/** The process-wide pool of the application's own, narrow database account. */
export function database(): Sequelize {
  store.heartcutSequelize ??= connect();
  return store.heartcutSequelize;
}

export async function closeDatabase(): Promise<void> {
  await store.heartcutSequelize?.close();
  store.heartcutSequelize = undefined;
}
