import { QueryTypes } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { findCompoundIds } from './find-compounds';
import { afterFallingFilled, joinParts, likeAnywhere, type SqlPart, sqlInstant } from './keyset';
import { requirePerson } from '@/lib/auth/require-person';
import type { RunListQuery, RunRow } from './schema';

type Row = Omit<RunRow, 'targetCompound' | 'group' | 'startedAt' | 'endedAt'> & {
  targetId: string;
  targetName: string;
  casNumber: string | null;
  groupId: string;
  groupName: string;
  startedAt: Date;
  endedAt: Date | null;
};

/** Runs of the caller's groups, the latest start first, one keyset page. */
export async function listRuns(actor: Actor, query: RunListQuery): Promise<Page<RunRow>> {
  const visible = visibleGroupIds(requirePerson(actor));
  const groupIds = query.group === undefined ? visible : visible.filter((id) => id === query.group);
  const compoundIds = query.compound === undefined ? null : await findCompoundIds(query.compound);
  const parts: SqlPart[] = [{ sql: 'r.groupId IN (?)', values: [groupIds] }];
  if (query.cursor !== undefined) {
    const [key, id] = decodeCursor('-startedAt', query.cursor, ['instant', 'id']);
    parts.push(afterFallingFilled('r.startedAt', 'r.id', key, id));
  }
  if (groupIds.length === 0 || compoundIds?.length === 0) return { items: [], nextCursor: null };
  if (compoundIds) parts.push({ sql: 'r.targetCompoundId IN (?)', values: [compoundIds] });
  if (query.q) {
    const columns = ['r.code', 'r.chargeSource', 'r.chargeLot', 'c.name'];
    parts.push({
      sql: `(${columns.map((column) => `${column} LIKE ?`).join(' OR ')})`,
      values: columns.map(() => likeAnywhere(query.q!)),
    });
  }
  const where = joinParts(parts, ' AND ');
  const rows = await database().query<Row>(
    `SELECT r.id, r.code, r.version, r.technique, r.chargeMassG, r.startedAt, r.endedAt,
       c.id AS targetId, c.name AS targetName, c.casNumber, u.name AS chemist, g.id AS groupId, g.name AS groupName,
       (SELECT COUNT(*) FROM fractions f WHERE f.runId = r.id) AS fractionCount,
       (SELECT COUNT(*) FROM fractions f WHERE f.runId = r.id AND f.status = 'signed off') AS signedOffCount
     FROM runs r JOIN compounds c ON c.id = r.targetCompoundId JOIN users u ON u.id = r.chemistId
     JOIN \`groups\` g ON g.id = r.groupId
     WHERE ${where.sql} ORDER BY r.startedAt DESC, r.id DESC LIMIT ?`,
    { replacements: [...where.values, query.limit + 1], type: QueryTypes.SELECT },
  );
  const cursorOf = (row: Row) => encodeCursor('-startedAt', [sqlInstant(new Date(row.startedAt)), row.id]);
  return toPage(rows, query.limit, presentRow, cursorOf);
}

function presentRow(row: Row): RunRow {
  return {
    id: row.id,
    code: row.code,
    version: row.version,
    targetCompound: { id: row.targetId, name: row.targetName, cas: row.casNumber },
    technique: row.technique,
    chargeMassG: row.chargeMassG,
    chemist: row.chemist,
    group: { id: row.groupId, name: row.groupName },
    startedAt: new Date(row.startedAt).toISOString(),
    endedAt: row.endedAt && new Date(row.endedAt).toISOString(),
    fractionCount: Number(row.fractionCount),
    signedOffCount: Number(row.signedOffCount),
  };
}
