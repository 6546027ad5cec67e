import { recorded, type Recorder } from '@/lib/audit/recorded';
import type { Actor, Role } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Membership, User } from '@/lib/database/records';
import { notFound, Problem } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';
import { type NewMembership, requireGroups } from './create-user';

export type UserChange = {
  name?: string;
  isAdmin?: boolean;
  disabled?: boolean;
  memberships?: NewMembership[];
  reason: string;
};

/** Gives and takes roles until they are as wished; one event a role. */
async function changeRoles(
  { transaction, record }: Recorder,
  user: User,
  wished: NewMembership[],
  reason: string,
): Promise<void> {
  const present = await Membership.findAll({ where: { userId: user.id }, transaction });
  const wants = (groupId: string, role: Role) => wished.some((m) => m.group === groupId && m.role === role);
  for (const membership of present) {
    if (wants(membership.groupId, membership.role)) continue;
    await membership.destroy({ transaction });
    record({
      type: 'membership.withdrawn',
      recordType: 'user',
      recordId: user.id,
      groupId: membership.groupId,
      before: { role: membership.role },
      reason,
    });
  }
  for (const { group, role } of wished) {
    if (present.some((m) => m.groupId === group && m.role === role)) continue;
    await Membership.create({ id: newId(), userId: user.id, groupId: group, role }, { transaction });
    record({
      type: 'membership.granted',
      recordType: 'user',
      recordId: user.id,
      groupId: group,
      after: { role },
      reason,
    });
  }
}

/**
 * Changes name, admin flag, roles, or disables an account. It counts from the account's next click;
 * disabling also ends its sign-ins for good.
 */
export async function changeUser(
  actor: Actor,
  id: string,
  version: number,
  change: UserChange,
): Promise<void> {
  authorise(actor, 'administration.write', null);
  await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const user = await User.findByPk(id, { transaction, lock: true });
    if (!user) throw notFound('account');
    requireSameVersion(user, version);
    if (actor.kind === 'user' && actor.userId === id && (change.disabled || change.isAdmin === false)) {
      throw new Problem(
        'state-conflict',
        'You cannot take your own administration away. Ask another administrator.',
      );
    }
    const before = { name: user.name, isAdmin: user.isAdmin, disabledAt: user.disabledAt };
    user.set({
      name: change.name ?? user.name,
      isAdmin: change.isAdmin ?? user.isAdmin,
      disabledAt:
        change.disabled === undefined
          ? user.disabledAt
          : change.disabled
            ? (user.disabledAt ?? new Date())
            : null,
    });
    if (change.disabled && !before.disabledAt) user.sessionVersion += 1;
    // The version moves even when only roles change, so that two administrators do not cross.
    user.changed('updatedAt', true);
    await user.save({ transaction });
    record({
      type: 'user.changed',
      recordType: 'user',
      recordId: user.id,
      before,
      after: { name: user.name, isAdmin: user.isAdmin, disabledAt: user.disabledAt },
      reason: change.reason,
    });
    if (change.memberships) {
      await changeRoles(recorder, user, await requireGroups(change.memberships, transaction), change.reason);
    }
  });
}
