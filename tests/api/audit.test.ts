import { QueryTypes } from 'sequelize';
import { afterAll, describe, expect, it } from 'vitest';
import { firstHash, hashEvent } from '@/lib/audit/chain';
import { isIntact, toEvent } from '@/lib/audit/list-events';
import { recorded } from '@/lib/audit/recorded';
import { systemActor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { newId } from '@/lib/database/ids';
import { Group } from '@/lib/database/records';
import { buildGroup, buildUser } from '../factories/records';
import { signedIn, stopTestServer, unique } from '../support/test-server';

afterAll(stopTestServer);

type StoredEvent = Parameters<typeof toEvent>[0];
const stored = () =>
  database().query<StoredEvent>('SELECT * FROM audit_events ORDER BY sequence', { type: QueryTypes.SELECT });

describe('the audit trail', () => {
  it('chains every event to the one before, without gaps, under twenty writers at once', async () => {
    await Promise.all(
      Array.from({ length: 20 }, () =>
        recorded(systemActor(), async ({ transaction, record }) => {
          const group = await Group.create({ id: newId(), name: unique('Group') }, { transaction });
          record({
            type: 'group.created',
            recordType: 'group',
            recordId: group.id,
            after: { name: group.name, ratio: 1e-7 },
          });
        }),
      ),
    );
    const rows = await stored();
    let previous = firstHash;
    rows.forEach((row, index) => {
      expect(Number(row.sequence)).toBe(index + 1);
      expect(row.previousHash).toBe(previous);
      const { hash, ...event } = toEvent(row);
      expect(hashEvent(event)).toBe(hash);
      previous = row.hash;
    });
  });

  it('names an event whose text was changed', async () => {
    const rows = await stored();
    const last = rows.at(-1)!;
    expect(isIntact(last)).toBe(true);
    expect(isIntact({ ...last, actorName: `${last.actorName}x` })).toBe(false);
  });

  it('cannot be changed or deleted with the rights of the application', async () => {
    await expect(
      database().query("UPDATE audit_events SET actorName = 'nobody'", { type: QueryTypes.UPDATE }),
    ).rejects.toThrow(/denied/);
    await expect(database().query('DELETE FROM audit_events', { type: QueryTypes.DELETE })).rejects.toThrow(
      /denied/,
    );
  });

  it('refuses a write that would leave no event, and keeps nothing of it', async () => {
    const name = unique('Group');
    await expect(
      recorded(systemActor(), ({ transaction }) => Group.create({ id: newId(), name }, { transaction })),
    ).rejects.toThrow(/without an audit event/);
    expect(await Group.count({ where: { name } })).toBe(0);
    await expect(Group.create({ id: newId(), name })).rejects.toThrow(/inside recorded/);
  });

  it('shows a PI the events of their own group only, and a chemist none', async () => {
    const [group, other] = [await buildGroup(), await buildGroup()];
    const pi = await buildUser({ group, roles: ['pi'] });
    const chemist = await buildUser({ group, roles: ['chemist'] });
    for (const { id } of [group, other]) {
      await recorded(systemActor(), async ({ record }) =>
        record({ type: 'run.created', recordType: 'run', recordId: id, groupId: id }),
      );
    }
    const agent = await signedIn({ email: pi.email, password: pi.plainPassword });
    const { body } = await agent.get('/api/v1/audit').expect(200);
    expect(body.items.map((event: { groupId: string }) => event.groupId)).toEqual([group.id]);
    await agent.get('/api/v1/audit?record=nonsense').expect(400);
    await agent.get('/api/v1/audit?offset=3').expect(400);
    const theirs = await signedIn({ email: chemist.email, password: chemist.plainPassword });
    await theirs.get('/api/v1/audit').expect(403);
  });
});
