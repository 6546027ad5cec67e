import { cleanPercent } from '@/lib/acceptance/clean-percent';
import { QueryTypes } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { type CursorKind, decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { filterParts } from './fraction-filters';
import type { FractionListQuery, FractionRow, FractionSort } from './fraction-schema';
import { findCompoundIds } from './find-compounds';
import { afterFalling, afterFallingFilled, afterRising, joinParts, type SqlPart, sqlInstant } from './keyset';
import { requirePerson } from '@/lib/auth/require-person';

type Row = Omit<FractionRow, 'run' | 'compound' | 'group' | 'collectedAt'> & {
  runCode: string;
  compoundId: string;
  compoundName: string;
  casNumber: string | null;
  groupId: string;
  groupName: string;
  collectedAt: Date | string;
  codeOrder: string;
};
type Key = string | number | null;
type Order = {
  column: string;
  kind: CursorKind;
  order: (table: string) => string;
  after: (key: Key, id: Key) => SqlPart;
  keyOf: (row: Row) => Key;
};

const orders: Record<FractionSort, Order> = {
  '-collectedAt': {
    column: 'collectedAt',
    kind: 'instant',
    order: (table) => `${table}.collectedAt DESC, ${table}.id DESC`,
    after: (key, id) => afterFallingFilled('f.collectedAt', 'f.id', key, id),
    keyOf: (row) => sqlInstant(new Date(row.collectedAt)),
  },
  '-purity': {
    column: 'purityPercent',
    kind: 'number or none',
    // MariaDB counts an empty value as the smallest: without a purity means last.
    order: (table) => `${table}.purityPercent DESC, ${table}.id DESC`,
    after: (key, id) => afterFalling('f.purityPercent', 'f.id', key, id),
    keyOf: (row) => row.purityPercent,
  },
  code: {
    column: 'codeOrder',
    kind: 'text',
    order: (table) => `${table}.codeOrder ASC, ${table}.id ASC`,
    after: (key, id) => afterRising('f.codeOrder', 'f.id', key, id),
    keyOf: (row) => row.codeOrder,
  },
};

/**
 * Fractions of the caller's groups by filters, one keyset page. Each group is walked along its own index
 * and only the first rows of each are put together: the time depends on the page, not on the table.
 */
export async function listFractions(actor: Actor, query: FractionListQuery): Promise<Page<FractionRow>> {
  const { limit, cursor, sort, compound, group, ...filters } = query;
  const visible = visibleGroupIds(requirePerson(actor));
  const groupIds = group === undefined ? visible : visible.filter((id) => id === group);
  const compoundIds = compound === undefined ? null : await findCompoundIds(compound);
  const order = orders[sort];
  const after = cursor === undefined ? [] : [readAfter(order, sort, cursor)];
  if (groupIds.length === 0 || compoundIds?.length === 0) return { items: [], nextCursor: null };
  const where = joinParts([...filterParts(filters, compoundIds), ...after], ' AND ');
  const ofGroups = groupIds.map((groupId) => ({
    sql: `(SELECT f.id, f.${order.column} FROM fractions f WHERE f.groupId = ?${where.sql && ` AND ${where.sql}`}
           ORDER BY ${order.order('f')} LIMIT ?)`,
    values: [groupId, ...where.values, limit + 1],
  }));
  const found = joinParts(ofGroups, ' UNION ALL ');
  const rows = await database().query<Row>(
    `SELECT f.id, f.version, f.code, f.codeOrder, r.code AS runCode, c.id AS compoundId, c.name AS compoundName, c.casNumber,
       f.cut, f.netMassG, f.status, f.verdictState AS verdict, f.purityPercent, f.collectedAt,
       u.name AS collectedBy, g.id AS groupId, g.name AS groupName
     FROM (SELECT k.* FROM (${found.sql}) k ORDER BY ${order.order('k')} LIMIT ?) page
     JOIN fractions f ON f.id = page.id JOIN runs r ON r.id = f.runId JOIN compounds c ON c.id = f.compoundId
     JOIN users u ON u.id = f.collectedById JOIN \`groups\` g ON g.id = f.groupId
     ORDER BY ${order.order('f')}`,
    { replacements: [...found.values, limit + 1], type: QueryTypes.SELECT },
  );
  return toPage(rows, limit, presentRow, (row) => encodeCursor(sort, [order.keyOf(row), row.id]));
}

function readAfter(order: Order, sort: FractionSort, cursor: string): SqlPart {
  const [key, id] = decodeCursor(sort, cursor, [order.kind, 'id']);
  return order.after(key, id);
}

function presentRow(row: Row): FractionRow {
  return {
    id: row.id,
    version: row.version,
    code: row.code,
    run: row.runCode,
    compound: { id: row.compoundId, name: row.compoundName, cas: row.casNumber },
    cut: row.cut,
    netMassG: row.netMassG,
    status: row.status,
    verdict: row.verdict,
    purityPercent: row.purityPercent === null ? null : cleanPercent(row.purityPercent),
    collectedAt: new Date(row.collectedAt).toISOString(),
    collectedBy: row.collectedBy,
    group: { id: row.groupId, name: row.groupName },
  };
}
