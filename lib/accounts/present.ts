import { z } from 'zod';
import type { Actor } from '@/lib/auth/actor';

export const meSchema = z.object({
  kind: z.enum(['user', 'token', 'system']),
  name: z.string(),
  email: z.string().optional(),
  isAdmin: z.boolean().optional(),
  mustChangePassword: z.boolean().optional(),
  groups: z.array(z.object({ id: z.string(), name: z.string(), roles: z.array(z.string()) })).optional(),
  instrumentId: z.string().optional(),
  scopes: z.array(z.string()).optional(),
});

/** The caller as JSON: a person with groups and roles, or a token with its instrument and scopes. */
export function presentActor(actor: Actor): z.infer<typeof meSchema> {
  if (actor.kind === 'token') {
    return { kind: 'token', name: actor.name, instrumentId: actor.instrumentId, scopes: actor.scopes };
  }
  if (actor.kind === 'system') return { kind: 'system', name: actor.name };
  const groups = new Map<string, { id: string; name: string; roles: string[] }>();
  for (const { groupId, groupName, role } of actor.memberships) {
    const group = groups.get(groupId) ?? { id: groupId, name: groupName, roles: [] };
    group.roles.push(role);
    groups.set(groupId, group);
  }
  return {
    kind: 'user',
    name: actor.name,
    email: actor.email,
    isAdmin: actor.isAdmin,
    mustChangePassword: actor.mustChangePassword,
    groups: [...groups.values()],
  };
}
