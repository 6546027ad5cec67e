import type { Transaction } from 'sequelize';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Integration, Peak } from '@/lib/database/records';
import { resolveCompound } from '@/lib/distillation/resolve-compounds';
import { invalidField, Problem } from '@/lib/errors';
import { carryAssignments } from './carry-assignments';
import { keptOf } from './create-trace';
import type { Integration as IntegrationFound } from './integration';
import { integrationParametersSchema } from './parameters';
import { integratePoints } from './parse-trace';
import { placeChanged } from './place-changed';
import { lockPlace, requireTrace, requireTraceForChange } from './require-trace';
import type { NewIntegration } from './schema';
import { readTracePoints } from './trace-points';
import { writeIntegration } from './write-integration';

const meanwhile = new Problem(
  'version-conflict',
  'Somebody else read or integrated this trace a moment ago. Reload it, compare, then make your change again.',
);

/**
 * Adds a version of a trace's integration, with other parameters, other assignments or both, and puts it in force.
 * The earlier ones stay. Returns its id. 404, 403, 409, and 422 for parameters, peaks or compounds that do not fit.
 */
export async function integrateTrace(actor: Actor, traceId: string, body: NewIntegration): Promise<string> {
  const { trace: known, evidence, run, fraction } = await requireTrace(actor, traceId);
  authorise(actor, 'trace.write', known.groupId);
  const inForce = await Integration.findByPk(known.inForceIntegrationId ?? '');
  const parameters = body.parameters ?? integrationParametersSchema.parse(inForce?.parameters ?? {});
  const { read } = keptOf(known);
  const found = integratePoints((await readTracePoints(evidence, read)).points, parameters);
  requirePeaks(body, found);
  return recorded(actor, async (recorder) => {
    const { transaction } = recorder;
    const place = await lockPlace(
      actor,
      { fractionCode: fraction?.code ?? null, runCode: run.code },
      transaction,
    );
    const trace = await requireTraceForChange(traceId, transaction);
    if (JSON.stringify(keptOf(trace).read) !== JSON.stringify(read)) throw meanwhile;
    // Whoever changes assignments alone means the peaks that they saw.
    if (!body.parameters && trace.inForceIntegrationId !== known.inForceIntegrationId) throw meanwhile;
    const { integration } = await writeIntegration(recorder, trace, {
      found,
      parameters,
      read,
      reason: body.reason,
      author: { id: actor.kind === 'user' ? actor.userId : null, name: actor.name },
      compoundIds: await assignmentsOf(body, found, trace.inForceIntegrationId, transaction),
    });
    await placeChanged(recorder, place, 'trace integrated anew');
    return integration.id;
  });
}

function requirePeaks(body: NewIntegration, found: IntegrationFound): void {
  body.assign?.forEach(({ peak }, at) => {
    if (peak > found.peaks.length)
      throw invalidField(
        `assign.${at}.peak`,
        `There is no peak ${peak}: with these parameters the trace has ${found.peaks.length}.`,
      );
  });
}

async function assignmentsOf(
  body: NewIntegration,
  found: IntegrationFound,
  beforeId: string | null,
  transaction: Transaction,
): Promise<Map<number, string>> {
  const before = beforeId ? await Peak.findAll({ where: { integrationId: beforeId }, transaction }) : [];
  const compoundIds = carryAssignments(before, found.peaks);
  for (const [at, { peak, compound }] of (body.assign ?? []).entries()) {
    if (compound === null) compoundIds.delete(peak);
    else compoundIds.set(peak, (await resolveCompound(compound, `assign.${at}.compound`, transaction)).id);
  }
  return compoundIds;
}
