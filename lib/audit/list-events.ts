import { QueryTypes } from 'sequelize';
import type { z } from 'zod';
import { type Actor, rolesIn, visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { database } from '@/lib/database/connection';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { type ChainedEvent, hashEvent } from './chain';
import type { auditQuery, PresentedAuditEvent } from './schema';

type Row = Omit<ChainedEvent, 'at' | 'before' | 'after' | 'origin'> & {
  at: Date | string;
  before: string | null;
  after: string | null;
  origin: string;
  hash: string;
};

function parse(text: string | null): unknown {
  return text === null ? null : JSON.parse(text);
}

/** A stored row as the event that was hashed. */
export function toEvent(row: Row): ChainedEvent & { hash: string } {
  return {
    ...row,
    sequence: Number(row.sequence),
    at: new Date(row.at).toISOString(),
    before: parse(row.before),
    after: parse(row.after),
    origin: parse(row.origin),
  };
}

/** Whether an event still has the hash it was written with. */
export function isIntact(row: Row): boolean {
  const { hash, ...event } = toEvent(row);
  return hashEvent(event) === hash;
}

/**
 * The trail, newest first. A PI sees the events of the groups they lead; an administrator sees all,
 * which are facts about accounts and records, not the evidence itself.
 */
export async function listAuditEvents(
  actor: Actor,
  query: z.output<typeof auditQuery>,
): Promise<Page<PresentedAuditEvent>> {
  authorise(actor, 'audit.read', null);
  const where = ['1 = 1'];
  const replacements: Record<string, unknown> = { limit: query.limit + 1 };
  if (!(actor.kind === 'user' && actor.isAdmin)) {
    where.push('groupId IN (:groups)');
    replacements.groups = visibleGroupIds(actor).filter((id) => rolesIn(actor, id).includes('pi'));
  }
  if (query.record) {
    const [kind, id] = query.record.split(':');
    where.push('recordType = :kind AND recordId = :recordId');
    Object.assign(replacements, { kind, recordId: id });
  }
  if (query.actor) {
    where.push('actorId = :actor');
    replacements.actor = query.actor;
  }
  if (query.type) {
    where.push('type = :type');
    replacements.type = query.type;
  }
  if (query.from) {
    where.push('at >= :from');
    replacements.from = new Date(query.from);
  }
  if (query.cursor) {
    where.push('sequence < :after');
    replacements.after = decodeCursor('audit', query.cursor, ['number'])[0];
  }
  const rows = await database().query<Row>(
    `SELECT sequence, id, at, type, recordType, recordId, groupId, actorKind, actorId, actorName, reason, \`before\`, \`after\`, origin, previousHash, hash
     FROM audit_events WHERE ${where.join(' AND ')} ORDER BY sequence DESC LIMIT :limit`,
    { replacements, type: QueryTypes.SELECT },
  );
  return toPage(rows, query.limit, toEvent, (row) => encodeCursor('audit', [Number(row.sequence)]));
}
