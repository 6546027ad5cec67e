import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';

/**
 * The next run code of a year, `D-2026-0042`. The counter's row stays locked until the transaction ends,
 * and a rollback gives the number back: no gaps and no doubles.
 */
export async function takeRunCode(startedAt: Date, transaction: Transaction): Promise<string> {
  const year = startedAt.getUTCFullYear();
  const scope = `run:${year}`;
  // One statement that takes the exclusive lock at once; insert-ignore and then a lock would deadlock.
  await database().query(
    `INSERT INTO code_counters (scope, nextNumber) VALUES (?, 2)
     ON DUPLICATE KEY UPDATE nextNumber = nextNumber + 1`,
    { replacements: [scope], type: QueryTypes.INSERT, transaction },
  );
  const [row] = await database().query<{ nextNumber: number }>(
    'SELECT nextNumber FROM code_counters WHERE scope = ?',
    { replacements: [scope], type: QueryTypes.SELECT, transaction },
  );
  if (!row) throw new Error(`The counter ${scope} has lost its row`);
  return `D-${year}-${String(row.nextNumber - 1).padStart(4, '0')}`;
}
