import { Op } from 'sequelize';
import type { Actor } from '@/lib/auth/actor';
import { LogReading } from '@/lib/database/records';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { requirePerson } from '@/lib/auth/require-person';
import { presentReading } from './present';
import type { ReadingJson, ReadingListQuery } from './reading-schema';
import { requireRun } from './require-run';

/** Log readings of a run in the order of their times, one keyset page; 404 for a run that is not visible. */
export async function listReadings(
  actor: Actor,
  runCode: string,
  { limit, cursor }: ReadingListQuery,
): Promise<Page<ReadingJson>> {
  const run = await requireRun(requirePerson(actor), runCode);
  const rows = await LogReading.findAll({
    where: { runId: run.id, ...(cursor === undefined ? {} : after(cursor)) },
    order: [
      ['at', 'ASC'],
      ['id', 'ASC'],
    ],
    limit: limit + 1,
  });
  return toPage(rows, limit, presentReading, (row) => encodeCursor('at', [row.at.toISOString(), row.id]));
}

function after(cursor: string) {
  const [at, id] = decodeCursor('at', cursor, ['instant', 'id']);
  const time = new Date(at);
  return { at: { [Op.gte]: time }, [Op.or]: [{ at: { [Op.gt]: time } }, { id: { [Op.gt]: id } }] };
}
