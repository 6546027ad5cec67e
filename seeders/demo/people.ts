import { createHmac } from 'node:crypto';
import { hashPassword } from '@/lib/accounts/password';
import type { Role, UserActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import { Group, Membership, User } from '@/lib/database/records';
import { env } from '@/lib/env';
import demoAccounts from '../demo-accounts.json';
import { seedOnce } from '../seed-step';

export type DemoGroup = 'terpenes' | 'solvents';

const GROUP_NAMES: Readonly<Record<DemoGroup, string>> = {
  terpenes: 'Terpene bench (invented)',
  solvents: 'Solvent recovery (invented)',
};

interface Person {
  email: string;
  name: string;
  role: Role | 'admin';
  group: DemoGroup | null;
  password: string;
}

/** Accounts of the second group have no published password: it follows from the secret of this installation. */
function unpublishedPassword(email: string): string {
  return createHmac('sha256', env().authSecret).update(`demo account ${email}`).digest('base64url');
}

function secondGroup(local: string, name: string, role: Role): Person {
  const email = `${local}@heartcut.example`;
  return { email, name, role, group: 'solvents', password: unpublishedPassword(email) };
}

/** All people here are invented. */
function people(): Person[] {
  const published = demoAccounts.map((account) => ({
    ...account,
    role: account.role as Person['role'],
    group: account.role === 'admin' ? null : ('terpenes' as const),
  }));
  return [
    ...published,
    secondGroup('mira.solberg', 'Mira Solberg', 'chemist'),
    secondGroup('jonas.achterberg', 'Jonas Achterberg', 'analyst'),
    secondGroup('leila.haddad', 'Dr Leila Haddad', 'pi'),
  ];
}

/** The person as the commands know a caller, with the password that a signature asks for. */
export type Signatory = { actor: UserActor; password: string };
export type Team = { group: Group; chemist: Signatory; analyst: Signatory; pi: Signatory };
export type Staff = { admin: UserActor; teams: Record<DemoGroup, Team> };

async function layOutPeople(): Promise<void> {
  const accounts = people();
  const hashes = await Promise.all(accounts.map(({ password }) => hashPassword(password)));
  await seedOnce('demo people', 'laboratory.seeded', async ({ transaction }) => {
    const groups = new Map<DemoGroup, Group>();
    for (const key of Object.keys(GROUP_NAMES) as DemoGroup[])
      groups.set(key, await Group.create({ id: newId(), name: GROUP_NAMES[key] }, { transaction }));
    for (const [at, { email, name, role, group }] of accounts.entries()) {
      const user = await User.create(
        { id: newId(), email, name, passwordHash: hashes[at]!, isAdmin: role === 'admin' },
        { transaction },
      );
      if (role === 'admin' || group === null) continue;
      const groupId = groups.get(group)!.id;
      await Membership.create({ id: newId(), userId: user.id, groupId, role }, { transaction });
    }
    return { groups: Object.values(GROUP_NAMES), people: accounts.map(({ name }) => name) };
  });
}

async function actorOf({ email, role }: Person, group: Group | null): Promise<UserActor> {
  const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
  const memberships = group && role !== 'admin' ? [{ groupId: group.id, groupName: group.name, role }] : [];
  return {
    kind: 'user',
    userId: user.id,
    name: user.name,
    email,
    isAdmin: user.isAdmin,
    mustChangePassword: false,
    memberships,
    origin: { requestId: 'seeding', address: null, userAgent: 'Heartcut seeder' },
  };
}

/** Two groups and their invented people. Lays them out where they are not there yet. */
export async function requireStaff(): Promise<Staff> {
  await layOutPeople();
  const accounts = people();
  const teamOf = async (key: DemoGroup): Promise<Team> => {
    const group = await Group.findOne({ where: { name: GROUP_NAMES[key] }, rejectOnEmpty: true });
    const signatory = async (role: Role): Promise<Signatory> => {
      const person = accounts.find((one) => one.group === key && one.role === role);
      if (!person) throw new Error(`The demo group ${key} has no ${role}.`);
      return { actor: await actorOf(person, group), password: person.password };
    };
    return {
      group,
      chemist: await signatory('chemist'),
      analyst: await signatory('analyst'),
      pi: await signatory('pi'),
    };
  };
  const admin = accounts.find(({ role }) => role === 'admin')!;
  return {
    admin: await actorOf(admin, null),
    teams: { terpenes: await teamOf('terpenes'), solvents: await teamOf('solvents') },
  };
}
