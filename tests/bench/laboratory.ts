import type { UserActor } from '@/lib/auth/actor';
import {
  buildCompound,
  buildFraction,
  buildGroup,
  buildRun,
  buildToken,
  buildUser,
} from '../factories/records';

export type Laboratory = Awaited<ReturnType<typeof buildLaboratory>>;

/** An invented group with one person of all roles, an instrument's token, and a run with one fraction. */
export async function buildLaboratory() {
  const group = await buildGroup();
  const person = await buildUser({ group, roles: ['chemist', 'analyst', 'pi'] });
  const target = await buildCompound();
  const run = await buildRun({ group, chemist: person, target });
  const fraction = await buildFraction({ run });
  const { token } = await buildToken({ group });
  const actor: UserActor = {
    kind: 'user',
    userId: person.id,
    name: person.name,
    email: person.email,
    isAdmin: false,
    mustChangePassword: false,
    memberships: [{ groupId: group.id, groupName: group.name, role: 'chemist' }],
    origin: { requestId: 'bench', address: null, userAgent: null },
  };
  return { group, person, target, run, fraction, token, actor };
}
