import type { Recorder } from '@/lib/audit/recorded';
import type { Role } from '@/lib/auth/actor';
import { type Fraction, Membership, User } from '@/lib/database/records';
import { env } from '@/lib/env';
import { queueMessage } from '@/lib/mail/queue-message';

/** Addresses of everybody with one of the roles in a group, and of named people; no disabled accounts, nobody twice. */
async function addressesOf(
  { transaction }: Recorder,
  wanted: { groupId: string; roles: Role[]; userIds: string[] },
): Promise<{ id: string; email: string; name: string }[]> {
  const memberships =
    wanted.roles.length === 0
      ? []
      : await Membership.findAll({ where: { groupId: wanted.groupId, role: wanted.roles }, transaction });
  const ids = [...new Set([...wanted.userIds, ...memberships.map((membership) => membership.userId)])];
  return User.findAll({ where: { id: ids, disabledAt: null }, order: [['email', 'ASC']], transaction });
}

/**
 * Puts one e-mail a person into the outbox about a step of a fraction, but none to whoever took the step.
 * `roles` are looked up in the fraction's group.
 */
export async function tellPeople(
  recorder: Recorder,
  fraction: Fraction,
  message: { kind: string; roles: Role[]; userIds?: string[]; subject: string; lines: string[] },
): Promise<void> {
  const people = await addressesOf(recorder, {
    groupId: fraction.groupId,
    roles: message.roles,
    userIds: message.userIds ?? [],
  });
  const { actor } = recorder;
  for (const person of people) {
    if (actor.kind === 'user' && actor.userId === person.id) continue;
    await queueMessage(recorder, {
      kind: message.kind,
      recipient: person.email,
      subject: message.subject,
      body: [
        `${person.name},`,
        '',
        ...message.lines,
        '',
        `${env().publicUrl}/fractions/${fraction.code}`,
        '',
      ].join('\n'),
    });
  }
}
