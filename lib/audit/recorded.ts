import { QueryTypes, type Transaction } from 'sequelize';
import type { Actor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { newId } from '@/lib/database/ids';
import { inTransaction } from '@/lib/database/transaction';
import { type ChainedEvent, hashEvent } from './chain';
import type { AuditEventInput } from './event-types';
import { attachWriteLog } from './write-guard';

/** A transaction in which each change says what it was. `record` keeps events until the commit. */
export type Recorder = {
  transaction: Transaction;
  actor: Actor;
  record(event: AuditEventInput): void;
};

function actorFacts(actor: Actor) {
  return {
    actorKind: actor.kind,
    actorId: actor.kind === 'user' ? actor.userId : actor.kind === 'token' ? actor.tokenId : null,
    actorName: actor.name,
  };
}

async function appendEvents(
  events: AuditEventInput[],
  actor: Actor,
  transaction: Transaction,
): Promise<void> {
  // Last lock taken and first released: the chain has one end, so writers queue here, but only for
  // the few inserts before the commit.
  const [head] = await database().query<{ sequence: number | string; hash: string }>(
    'SELECT sequence, hash FROM audit_heads WHERE id = 1 FOR UPDATE',
    { type: QueryTypes.SELECT, transaction },
  );
  if (!head) throw new Error('audit_heads has lost its row');
  let sequence = Number(head.sequence);
  let previousHash = head.hash;
  const rows = events.map((input) => {
    sequence += 1;
    const event: ChainedEvent = {
      sequence,
      id: newId(),
      at: new Date().toISOString(),
      type: input.type,
      recordType: input.recordType,
      recordId: input.recordId,
      groupId: input.groupId ?? null,
      ...actorFacts(actor),
      reason: input.reason ?? null,
      // Through JSON once, so that what is hashed is what will be read back.
      before: JSON.parse(JSON.stringify(input.before ?? null)),
      after: JSON.parse(JSON.stringify(input.after ?? null)),
      origin: actor.origin,
      previousHash,
    };
    previousHash = hashEvent(event);
    return { ...event, hash: previousHash };
  });
  const columns = Object.keys(rows[0] as object);
  const values = rows.map((row) =>
    columns.map((column) => {
      const value = row[column as keyof typeof row];
      if (column === 'at') return (value as string).replace('T', ' ').replace('Z', '');
      if (column === 'before' || column === 'after') return value === null ? null : JSON.stringify(value);
      return column === 'origin' ? JSON.stringify(value) : value;
    }),
  );
  await database().query(`INSERT INTO audit_events (${columns.map((c) => `\`${c}\``).join(', ')}) VALUES ?`, {
    replacements: [values],
    type: QueryTypes.INSERT,
    transaction,
  });
  await database().query('UPDATE audit_heads SET sequence = ?, hash = ? WHERE id = 1', {
    replacements: [sequence, previousHash],
    type: QueryTypes.UPDATE,
    transaction,
  });
}

/**
 * The only way to change records: runs `work` in a transaction and writes its audit events in the
 * same one. Throws, and so undoes everything, when records were written and no event was recorded.
 */
export async function recorded<T>(actor: Actor, work: (recorder: Recorder) => Promise<T>): Promise<T> {
  return inTransaction(async (transaction) => {
    const writes = attachWriteLog(transaction);
    const events: AuditEventInput[] = [];
    const result = await work({ transaction, actor, record: (event) => void events.push(event) });
    if (writes.written.size > 0 && events.length === 0) {
      throw new Error(`Wrote ${[...writes.written].join(', ')} without an audit event`);
    }
    if (events.length > 0) await appendEvents(events, actor, transaction);
    return result;
  });
}
