import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';

/**
 * An account is locked for one address after four failures, so that nobody elsewhere can lock its owner out; an
 * address, which a laboratory may share, and an account as a whole after a hundred, the most that
 * NIST SP 800-63B (5.2.2) allows.
 */
export const freeTries = { accountAtAddress: 4, address: 100, account: 100 };
const longestLockSeconds = 900;

/** Seconds until this subject (an account's e-mail, or an address) may try again; 0 when it may. */
export async function secondsLocked(subject: string): Promise<number> {
  const [row] = await database().query<{ seconds: number | null }>(
    'SELECT TIMESTAMPDIFF(SECOND, UTC_TIMESTAMP(3), lockedUntil) + 1 AS seconds FROM sign_in_throttles WHERE subject = ? AND lockedUntil > UTC_TIMESTAMP(3)',
    { replacements: [subject], type: QueryTypes.SELECT },
  );
  return Math.max(0, Number(row?.seconds ?? 0));
}

/**
 * Counts a failure. After `free` of them the subject is locked for 2, 4, 8 ... seconds, at most a
 * quarter of an hour; a day without failures starts anew. The clock is the database's, one for all
 * app instances.
 */
export async function noteFailure(subject: string, free = freeTries.accountAtAddress): Promise<void> {
  await database().query(
    `INSERT INTO sign_in_throttles (subject, failures, lockedUntil, updatedAt) VALUES (:subject, 1, NULL, UTC_TIMESTAMP(3))
     ON DUPLICATE KEY UPDATE
       failures = IF(updatedAt < UTC_TIMESTAMP(3) - INTERVAL 1 DAY, 1, failures + 1),
       lockedUntil = IF(failures > :free, UTC_TIMESTAMP(3) + INTERVAL LEAST(:longest, POW(2, LEAST(failures - :free, 20))) SECOND, NULL),
       updatedAt = UTC_TIMESTAMP(3)`,
    { replacements: { subject, free, longest: longestLockSeconds }, type: QueryTypes.INSERT },
  );
}

export async function clearFailures(subject: string): Promise<void> {
  await database().query('DELETE FROM sign_in_throttles WHERE subject = ?', {
    replacements: [subject],
    type: QueryTypes.DELETE,
  });
}
