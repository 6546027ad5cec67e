export type Role = 'chemist' | 'analyst' | 'pi';
export type Scope = 'evidence:write' | 'readings:write';

/** Where a request came from, kept with each audit event. */
export type Origin = { requestId: string; address: string | null; userAgent: string | null };

export type UserActor = {
  kind: 'user';
  userId: string;
  name: string;
  email: string;
  isAdmin: boolean;
  mustChangePassword: boolean;
  memberships: { groupId: string; groupName: string; role: Role }[];
  origin: Origin;
};

export type TokenActor = {
  kind: 'token';
  tokenId: string;
  name: string;
  instrumentId: string;
  groupId: string;
  scopes: Scope[];
  origin: Origin;
};

/** The application itself: seeding, outbox, first integrations. */
export type SystemActor = { kind: 'system'; name: string; origin: Origin };

export type Actor = UserActor | TokenActor | SystemActor;

export function systemActor(name = 'Heartcut', requestId = 'system'): SystemActor {
  return { kind: 'system', name, origin: { requestId, address: null, userAgent: null } };
}

/** The groups whose records the actor may see. The system sees none by this way: it says what it wants. */
export function visibleGroupIds(actor: Actor): string[] {
  if (actor.kind === 'user') return [...new Set(actor.memberships.map((membership) => membership.groupId))];
  return actor.kind === 'token' ? [actor.groupId] : [];
}

export function rolesIn(actor: Actor, groupId: string): Role[] {
  if (actor.kind !== 'user') return [];
  return actor.memberships.filter((m) => m.groupId === groupId).map((m) => m.role);
}
