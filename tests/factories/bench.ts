import { QueryTypes } from 'sequelize';
import { recorded } from '@/lib/audit/recorded';
import { type Role, systemActor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { newId } from '@/lib/database/ids';
import { Membership } from '@/lib/database/records';
import { type Agent, signedIn } from '../support/test-server';
import { buildCompound, buildGroup, type BuiltUser, buildUser } from './records';

/** A group with one signed-in person of the given roles. */
export async function personIn(
  group: Awaited<ReturnType<typeof buildGroup>>,
  roles: Role[],
): Promise<{ user: BuiltUser; agent: Agent }> {
  const user = await buildUser({ group, roles });
  return { user, agent: await signedIn({ email: user.email, password: user.plainPassword }) };
}

/** Gives a person one more role. */
export async function grantRole(user: { id: string }, group: { id: string }, role: Role): Promise<void> {
  await recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    const membership = { id: newId(), userId: user.id, groupId: group.id, role };
    await Membership.create(membership, { transaction });
    record({ type: 'membership.granted', recordType: 'user', recordId: user.id, groupId: group.id });
  });
}

/** A new group, its signed-in chemist, and a compound to distil. */
export async function benchOfOne() {
  const group = await buildGroup();
  const { user, agent } = await personIn(group, ['chemist']);
  const target = await buildCompound();
  return { group, user, agent, target };
}

/** The least body that starts a run of `target`. */
export function runBody(target: { id: string }, fields: Record<string, unknown> = {}) {
  return {
    targetCompound: target.id,
    knownImpurities: [],
    technique: 'fractional',
    chargeMassG: 250,
    chargeSource: 'recovered from an invented reaction',
    ...fields,
  };
}

export type AuditRow = { type: string; before: unknown; after: unknown; reason: string | null };

/** The audit events of one record, the first one first. */
export async function eventsOf(recordId: string): Promise<AuditRow[]> {
  const rows = await database().query<AuditRow>(
    'SELECT type, `before`, `after`, reason FROM audit_events WHERE recordId = ? ORDER BY sequence',
    { replacements: [recordId], type: QueryTypes.SELECT },
  );
  const read = (value: unknown) => (typeof value === 'string' ? JSON.parse(value) : value);
  return rows.map((row) => ({ ...row, before: read(row.before), after: read(row.after) }));
}
