import { Problem } from '@/lib/errors';
import { type Actor, rolesIn } from './actor';
import { type Action, type Rule, roleTable } from './role-table';

function sayWhoMay(rule: Rule): string {
  const where = rule.anyGroup ? 'any group' : 'this group';
  const members = rule.roles
    .map((role) => (role === 'pi' ? 'a PI' : `a${role === 'analyst' ? 'n' : ''} ${role}`))
    .join(' or ');
  const who = members ? [`${members} of ${where}`] : [];
  if (rule.admin) who.push('an administrator');
  return who.join(', or ');
}

/** Whether the actor may do `action` on a record of `groupId` (null for what all groups share). */
export function mayDo(actor: Actor, action: Action, groupId: string | null): boolean {
  const rule: Rule = roleTable[action];
  if (actor.kind === 'system') return true;
  if (actor.kind === 'token')
    return rule.scope !== undefined && actor.scopes.includes(rule.scope) && actor.groupId === groupId;
  if (rule.admin && actor.isAdmin) return true;
  if (groupId === null || rule.anyGroup) return actor.memberships.some((m) => rule.roles.includes(m.role));
  return rolesIn(actor, groupId).some((role) => rule.roles.includes(role));
}

/** The reason why not, for a button that stays visible; null where the actor may. */
export function whyNot(actor: Actor, action: Action, groupId: string | null): string | null {
  if (mayDo(actor, action, groupId)) return null;
  if (actor.kind === 'token')
    return 'This token has no right for that. Ask an administrator for a token with the scope.';
  return `Only ${sayWhoMay(roleTable[action])} can do this.`;
}

/** Throws 403 with who may instead. The record must already have been loaded through the actor's groups. */
export function authorise(actor: Actor, action: Action, groupId: string | null): void {
  const reason = whyNot(actor, action, groupId);
  if (reason) throw new Problem('not-allowed', reason);
}
