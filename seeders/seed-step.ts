import { QueryTypes, type Transaction } from 'sequelize';
import { type Recorder, recorded } from '@/lib/audit/recorded';
import type { EventType } from '@/lib/audit/event-types';
import { systemActor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';

const RECORD_TYPE = 'seed step';

/** The application itself, as the author of what a seeder writes. */
export const seeder = systemActor('Heartcut seeder', 'seeding');

/** Whether a step has left its event: the event and what it wrote were committed together. */
export async function isSeeded(step: string, transaction?: Transaction): Promise<boolean> {
  const rows = await database().query(
    'SELECT sequence FROM audit_events WHERE recordType = ? AND recordId = ? LIMIT 1',
    { replacements: [RECORD_TYPE, step], type: QueryTypes.SELECT, transaction },
  );
  return rows.length > 0;
}

/**
 * Runs one step of seeding in a transaction of its own, once: a step that has been interrupted is undone and
 * runs anew, one that is done is not done again, also when two processes seed at the same time.
 * @returns true where the step was done now.
 */
export async function seedOnce(
  step: string,
  type: EventType,
  work: (recorder: Recorder) => Promise<Record<string, unknown>>,
): Promise<boolean> {
  return recorded(seeder, async (recorder) => {
    const { transaction } = recorder;
    // Taken before the look, so that a second process waits here and then sees the first one's event.
    await database().query('SELECT id FROM audit_heads WHERE id = 1 FOR UPDATE', {
      type: QueryTypes.SELECT,
      transaction,
    });
    if (await isSeeded(step, transaction)) return false;
    const after = await work(recorder);
    recorder.record({ type, recordType: RECORD_TYPE, recordId: step, after });
    return true;
  });
}
