import { randomUUID } from 'node:crypto';
import { getServerSession } from 'next-auth';
import { findTokenActor } from '@/lib/instruments/find-token-actor';
import { Group, Membership, User } from '@/lib/database/records';
import type { Actor, Origin, UserActor } from './actor';
import { isSessionEnded } from './ended-sessions';
import { authOptions } from './options';

type Session = { userId?: string; sessionVersion?: number; sessionId?: string };

export function originOf(headers: Headers): Origin {
  const forwarded = headers.get('x-forwarded-for');
  return {
    requestId: headers.get('x-request-id') ?? randomUUID(),
    address: forwarded?.split(',')[0]?.trim() ?? null,
    userAgent: headers.get('user-agent')?.slice(0, 300) ?? null,
  };
}

/** Loads an account with its roles; null when it is disabled or its sign-ins were ended. */
export async function loadUserActor(
  userId: string,
  sessionVersion: number,
  origin: Origin,
): Promise<UserActor | null> {
  const user = await User.findByPk(userId);
  if (!user || user.disabledAt || user.sessionVersion !== sessionVersion) return null;
  const memberships = await Membership.findAll({
    where: { userId },
    include: [{ model: Group, as: 'group' }],
    order: [['createdAt', 'ASC']],
  });
  return {
    kind: 'user',
    userId: user.id,
    name: user.name,
    email: user.email,
    isAdmin: user.isAdmin,
    mustChangePassword: user.mustChangePassword,
    memberships: memberships.map((membership) => ({
      groupId: membership.groupId,
      groupName: (membership as Membership & { group: Group }).group.name,
      role: membership.role,
    })),
    origin,
  };
}

/**
 * Who is calling: a bearer token's instrument, or the person of the browser session; null for nobody.
 * Roles and session version come from the database each time, so a right taken away is gone at once.
 */
export async function currentActor(headers: Headers): Promise<Actor | null> {
  const origin = originOf(headers);
  const authorization = headers.get('authorization');
  if (authorization) {
    const [scheme, token] = authorization.split(/\s+/, 2);
    return scheme?.toLowerCase() === 'bearer' && token ? findTokenActor(token, origin) : null;
  }
  const session = (await getServerSession(authOptions())) as Session | null;
  if (!session?.userId || typeof session.sessionVersion !== 'number' || !session.sessionId) return null;
  const [actor, ended] = await Promise.all([
    loadUserActor(session.userId, session.sessionVersion, origin),
    isSessionEnded(session.sessionId),
  ]);
  return ended ? null : actor;
}
