import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { mayDo, whyNot } from '@/lib/auth/authorise';

/** The groups whose tray the actor may see and empty. */
export function trayGroups(actor: Actor): string[] {
  return visibleGroupIds(actor).filter((groupId) => mayDo(actor, 'tray.file', groupId));
}

/** Why the actor has no tray at all, or null. */
export function whyNoTray(actor: Actor): string | null {
  if (trayGroups(actor).length > 0) return null;
  return whyNot(actor, 'tray.file', visibleGroupIds(actor)[0] ?? null);
}
