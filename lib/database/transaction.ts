import { setTimeout as sleep } from 'node:timers/promises';
import { Transaction } from 'sequelize';
import { database } from './connection';

const deadlock = 1213;
const lockWaitTimeout = 1205;

function isRetryable(error: unknown): boolean {
  const errno = (error as { original?: { errno?: number } })?.original?.errno;
  return errno === deadlock || errno === lockWaitTimeout;
}

/**
 * Runs `work` in one READ COMMITTED transaction and tries again after a deadlock, up to `attempts`
 * times. `work` must therefore have no effect outside the database (objects are stored before).
 */
export async function inTransaction<T>(
  work: (transaction: Transaction) => Promise<T>,
  attempts = 5,
): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await database().transaction(
        { isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED },
        work,
      );
    } catch (error) {
      if (attempt >= attempts || !isRetryable(error)) throw error;
      await sleep(10 * 2 ** attempt * (0.5 + Math.random()));
    }
  }
}
