import { type Actor, type UserActor, visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { requirePerson } from '@/lib/auth/require-person';
import { invalidField, Problem } from '@/lib/errors';

/** The groups where the actor is chemist, in the order of the memberships. */
export function groupsWhereChemist(actor: UserActor): { id: string; name: string }[] {
  return actor.memberships
    .filter((membership) => membership.role === 'chemist')
    .map(({ groupId, groupName }) => ({ id: groupId, name: groupName }));
}

/**
 * The group of a new run: the one asked for, or the only one where the caller is chemist. 403 for who is
 * chemist nowhere or not there, 422 for a group that the caller cannot see or when there is a choice.
 */
export function chooseGroup(actor: Actor, asked: string | undefined): string {
  const person = requirePerson(actor);
  const groups = groupsWhereChemist(person);
  if (groups.length === 0) {
    throw new Problem(
      'not-allowed',
      'Only a chemist can start a run. Ask a PI or an administrator for that role.',
    );
  }
  if (asked !== undefined) {
    if (!visibleGroupIds(person).includes(asked)) {
      throw invalidField('group', 'There is no such group that you can see. Give the id of one of yours.');
    }
    authorise(person, 'run.write', asked);
    return asked;
  }
  if (groups.length === 1) return groups[0]!.id;
  const names = groups.map(({ id, name }) => `${id} (${name})`).join(', ');
  throw invalidField('group', `You are chemist in several groups. Say which one with "group": ${names}.`);
}
