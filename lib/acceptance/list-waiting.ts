import { cleanPercent } from './clean-percent';
import { QueryTypes } from 'sequelize';
import type { UserActor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import type { FractionStatus } from '@/lib/distillation/fraction-states';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import type { Waiting } from './queue-schema';

type Row = {
  id: string;
  code: string;
  compound: string;
  cut: string;
  status: string;
  verdictState: string;
  purityPercent: number | null;
  criteria: string | null;
  collectedBy: string;
  collectedById: string;
  collectedAt: Date | string;
  since: Date | string | null;
  reason: string | null;
};

const sort = 'waiting:oldest';

function instant(value: Date | string): string {
  return (value instanceof Date ? value : new Date(`${value.replace(' ', 'T')}Z`)).toISOString();
}

/** The sentence of a stored verdict; null before there was one. */
function summaryOf(criteria: string | null): string | null {
  if (!criteria) return null;
  return (JSON.parse(criteria) as { summary?: string }).summary ?? null;
}

/**
 * Fractions that wait in some states, the ones collected first on top, by keyset; of one person if it is
 * given. `groupIds` are the groups that the reader may see.
 */
export async function listWaiting(
  actor: UserActor,
  filter: { groupIds: string[]; statuses: FractionStatus[]; collectedById?: string },
  page: { limit: number; cursor?: string | undefined },
): Promise<Page<Waiting>> {
  if (filter.groupIds.length === 0) return { items: [], nextCursor: null };
  const [at, id] = page.cursor ? decodeCursor(sort, page.cursor, ['instant', 'id']) : [null, null];
  const rows = await database().query<Row>(
    `SELECT f.id, f.code, c.name AS compound, f.cut, f.status, f.verdictState, f.purityPercent, v.criteria,
            u.name AS collectedBy, f.collectedById, f.collectedAt, t.at AS since, t.reason
     FROM fractions f
     JOIN compounds c ON c.id = f.compoundId
     JOIN users u ON u.id = f.collectedById
     LEFT JOIN verdicts v ON v.id = f.verdictId
     LEFT JOIN fraction_transitions t ON t.id = (
       SELECT id FROM fraction_transitions WHERE fractionId = f.id ORDER BY at DESC, id DESC LIMIT 1)
     WHERE f.groupId IN (:groupIds) AND f.status IN (:statuses)
       ${filter.collectedById ? 'AND f.collectedById = :collectedById' : ''}
       ${page.cursor ? 'AND f.collectedAt >= :at AND (f.collectedAt > :at OR f.id > :id)' : ''}
     ORDER BY f.collectedAt, f.id LIMIT :rows`,
    {
      replacements: {
        groupIds: filter.groupIds,
        statuses: filter.statuses,
        collectedById: filter.collectedById ?? null,
        at: typeof at === 'string' ? new Date(at) : null,
        id,
        rows: page.limit + 1,
      },
      type: QueryTypes.SELECT,
    },
  );
  return toPage(
    rows,
    page.limit,
    (row) => ({
      code: row.code,
      compound: row.compound,
      cut: row.cut,
      status: row.status,
      verdictState: row.verdictState,
      purityPercent: row.purityPercent === null ? null : cleanPercent(row.purityPercent),
      summary: summaryOf(row.criteria),
      collectedBy: row.collectedBy,
      since: instant(row.since ?? row.collectedAt),
      reason: row.reason,
      mine: row.collectedById === actor.userId,
    }),
    (row) => encodeCursor(sort, [instant(row.collectedAt), row.id]),
  );
}
