import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { newId } from '@/lib/database/ids';
import { Run, RunImpurity } from '@/lib/database/records';
import { chooseGroup } from './policy';
import { resolveCompound, resolveImpurities } from './resolve-compounds';
import { requireRunTimes } from './run-times';
import type { NewRun } from './schema';
import { takeRunCode } from './take-run-code';

/** Starts a run in the caller's group and returns its code. Throws 403 or a 422 that names the field. */
export async function createRun(actor: Actor, body: NewRun): Promise<{ code: string }> {
  const person = requirePerson(actor);
  const groupId = chooseGroup(actor, body.group);
  const { targetCompound, knownImpurities, group: _, ...facts } = body;
  const startedAt = body.startedAt ? new Date(body.startedAt) : new Date();
  const endedAt = body.endedAt ? new Date(body.endedAt) : null;
  requireRunTimes(startedAt, endedAt);
  return recorded(actor, async ({ transaction, record }) => {
    const target = await resolveCompound(targetCompound, 'targetCompound', transaction);
    const impurities = await resolveImpurities(knownImpurities, target, transaction);
    // Last, so that a body that does not hold never waits for the counter.
    const code = await takeRunCode(startedAt, transaction);
    const fields = { ...facts, safetyChecks: facts.safetyChecks ?? {}, startedAt, endedAt };
    const run = await Run.create(
      {
        ...fields,
        id: newId(),
        code,
        groupId,
        chemistId: person.userId,
        targetCompoundId: target.id,
      },
      { transaction },
    );
    await RunImpurity.bulkCreate(
      impurities.map((impurity) => ({ id: newId(), runId: run.id, compoundId: impurity.id })),
      { transaction },
    );
    record({
      type: 'run.created',
      recordType: 'run',
      recordId: run.id,
      groupId,
      after: {
        code,
        ...fields,
        targetCompound: { id: target.id, name: target.name },
        knownImpurities: impurities.map(({ id, name }) => ({ id, name })),
      },
    });
    return { code };
  });
}
