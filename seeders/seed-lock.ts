import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { env } from '@/lib/env';

const WAIT_SECONDS = 300;

/**
 * Lets one process seed at a time. The lock belongs to a connection of its own, so a process that dies gives it back.
 * @throws Error where another process seeds for longer than five minutes.
 */
export async function withSeedLock<T>(work: () => Promise<T>): Promise<T> {
  const name = `${env().database.name} seeding`;
  return database().transaction(async (transaction) => {
    const ask = (sql: string) =>
      database().query<{ held: number | null }>(sql, {
        replacements: { name, wait: WAIT_SECONDS },
        type: QueryTypes.SELECT,
        transaction,
      });
    const [answer] = await ask('SELECT GET_LOCK(:name, :wait) AS held');
    if (Number(answer?.held) !== 1)
      throw new Error('Another process is seeding this database. Wait until it is done, then start again.');
    try {
      return await work();
    } finally {
      await ask('SELECT RELEASE_LOCK(:name) AS held');
    }
  });
}
