import { Problem } from '@/lib/errors';
import type { Actor, UserActor } from './actor';

/** The caller as a person; 403 for a token, which has no password, no role and no signature. */
export function requirePerson(actor: Actor): UserActor {
  if (actor.kind === 'user') return actor;
  throw new Problem('not-allowed', 'Only a signed-in person can do this; an access token cannot.');
}
