import type { Role } from '@/lib/auth/actor';
import { type Agent, signedIn } from '../support/test-server';
import { buildIntegratedTrace, buildSpecification } from './acceptance';
import { buildEthylAcetate, buildFraction, buildGroup, type BuiltUser, buildRun, buildUser } from './records';

export type Person = BuiltUser & { agent: Agent };

/** A group with one signed-in person a role, and a run of ethyl acetate by the chemist. */
export async function buildBench() {
  const group = await buildGroup();
  const person = async (roles: Role[]): Promise<Person> => {
    const user = await buildUser({ group, roles });
    const agent = await signedIn({ email: user.email, password: user.plainPassword });
    return Object.assign(user, { agent });
  };
  const chemist = await person(['chemist']);
  const analyst = await person(['analyst']);
  const pi = await person(['pi']);
  const compound = await buildEthylAcetate();
  const run = await buildRun({ group, chemist, target: compound });
  return { group, chemist, analyst, pi, person, compound, run };
}

export type Bench = Awaited<ReturnType<typeof buildBench>>;

/** A fraction that meets an approved specification, submitted by its chemist. */
export async function buildSubmittedFraction(bench: Bench, purityPercent = 99.6) {
  await buildSpecification({ ...bench, edition: Math.floor(Math.random() * 1e9) });
  const fraction = await buildFraction({ run: bench.run });
  await buildIntegratedTrace(fraction, { purityPercent });
  await bench.chemist.agent.post(`/api/v1/fractions/${fraction.code}/submit`).send({}).expect(200);
  return fraction;
}

export const release = (person: { plainPassword: string }) => ({
  password: person.plainPassword,
  meaning: 'reviewed and released for use',
});
