import { randomBytes } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { recorded } from '@/lib/audit/recorded';
import type { Actor, Role } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Group, Membership, User } from '@/lib/database/records';
import { invalidField, Problem } from '@/lib/errors';
import { hashPassword } from './password';

export type NewMembership = { group: string; role: Role };
export type NewUser = { email: string; name: string; isAdmin: boolean; memberships: NewMembership[] };

/** 422 naming the entry whose group does not exist; doubled entries count once. */
export async function requireGroups(
  memberships: NewMembership[],
  transaction: Transaction,
): Promise<NewMembership[]> {
  const once = [...new Map(memberships.map((m) => [`${m.group} ${m.role}`, m])).values()];
  for (const [index, { group }] of once.entries()) {
    if (!(await Group.findByPk(group, { transaction }))) {
      throw invalidField(
        `memberships.${index}.group`,
        'There is no such group. Choose one from the list of groups.',
      );
    }
  }
  return once;
}

/**
 * Makes an account with a random first password, which is returned once and must be changed at the
 * first sign-in: no administrator knows a password that signs.
 */
export async function createUser(
  actor: Actor,
  input: NewUser,
): Promise<{ id: string; firstPassword: string }> {
  authorise(actor, 'administration.write', null);
  const firstPassword = randomBytes(12).toString('base64url');
  const passwordHash = await hashPassword(firstPassword);
  return recorded(actor, async ({ transaction, record }) => {
    if (await User.findOne({ where: { email: input.email }, transaction })) {
      throw new Problem(
        'already-exists',
        'There is an account with this e-mail address already. Open that one instead.',
      );
    }
    const memberships = await requireGroups(input.memberships, transaction);
    const user = await User.create(
      {
        id: newId(),
        email: input.email,
        name: input.name,
        isAdmin: input.isAdmin,
        passwordHash,
        mustChangePassword: true,
      },
      { transaction },
    );
    for (const { group, role } of memberships) {
      await Membership.create({ id: newId(), userId: user.id, groupId: group, role }, { transaction });
    }
    record({
      type: 'user.created',
      recordType: 'user',
      recordId: user.id,
      after: { email: user.email, name: user.name, isAdmin: user.isAdmin, memberships },
    });
    return { id: user.id, firstPassword };
  });
}
