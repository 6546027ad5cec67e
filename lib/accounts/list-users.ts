import { Op, type WhereOptions } from 'sequelize';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Group, Membership, User } from '@/lib/database/records';
import { notFound } from '@/lib/errors';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import type { PresentedUser } from './schema';

type UserWithRoles = User & { memberships: (Membership & { group: Group })[] };
const withRoles = [{ model: Membership, as: 'memberships', include: [{ model: Group, as: 'group' }] }];

export function presentUser(user: UserWithRoles): PresentedUser {
  return {
    id: user.id,
    email: user.email,
    name: user.name,
    isAdmin: user.isAdmin,
    mustChangePassword: user.mustChangePassword,
    disabledAt: user.disabledAt?.toISOString() ?? null,
    memberships: user.memberships.map((m) => ({ group: m.groupId, groupName: m.group.name, role: m.role })),
    version: user.version,
  };
}

/** Accounts by e-mail, for administrators. */
export async function listUsers(
  actor: Actor,
  { limit, cursor }: { limit: number; cursor?: string },
): Promise<Page<PresentedUser>> {
  authorise(actor, 'administration.write', null);
  const where: WhereOptions = cursor
    ? { email: { [Op.gt]: decodeCursor('email', cursor, ['text'])[0] as string } }
    : {};
  const rows = await User.findAll({ where, order: [['email', 'ASC']], limit: limit + 1, include: withRoles });
  return toPage(rows as UserWithRoles[], limit, presentUser, (user) => encodeCursor('email', [user.email]));
}

export async function requireUser(actor: Actor, id: string): Promise<UserWithRoles> {
  authorise(actor, 'administration.write', null);
  const user = await User.findByPk(id, { include: withRoles });
  if (!user) throw notFound('account');
  return user as UserWithRoles;
}

/** All groups by name, for administrators. */
export async function listGroups(actor: Actor): Promise<Group[]> {
  authorise(actor, 'administration.write', null);
  return Group.findAll({ order: [['name', 'ASC']], limit: 1000 });
}
