import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';

/** Eight hours: one working day at the bench. */
export const sessionSeconds = 8 * 60 * 60;

/** Ends one sign-in for good: its cookie is refused from now on, wherever a copy of it may be. */
export async function endSession(sessionId: string): Promise<void> {
  await database().query('INSERT IGNORE INTO ended_sessions (id, endedAt) VALUES (?, UTC_TIMESTAMP(3))', {
    replacements: [sessionId],
    type: QueryTypes.INSERT,
  });
}

export async function isSessionEnded(sessionId: string): Promise<boolean> {
  const rows = await database().query('SELECT id FROM ended_sessions WHERE id = ?', {
    replacements: [sessionId],
    type: QueryTypes.SELECT,
  });
  return rows.length > 0;
}

/** Forgets ended sign-ins whose cookies have run out by themselves. */
export async function forgetEndedSessions(): Promise<void> {
  await database().query(
    'DELETE FROM ended_sessions WHERE endedAt < UTC_TIMESTAMP(3) - INTERVAL ? SECOND LIMIT 1000',
    { replacements: [sessionSeconds + 3600], type: QueryTypes.DELETE },
  );
}
