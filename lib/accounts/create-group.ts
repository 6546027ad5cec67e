import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Group } from '@/lib/database/records';

/** Makes a group. Its records are seen by its members only. */
export async function createGroup(actor: Actor, name: string): Promise<Group> {
  authorise(actor, 'administration.write', null);
  return recorded(actor, async ({ transaction, record }) => {
    const group = await Group.create({ id: newId(), name }, { transaction });
    record({
      type: 'group.created',
      recordType: 'group',
      recordId: group.id,
      groupId: group.id,
      after: { name },
    });
    return group;
  });
}
