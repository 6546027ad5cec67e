import { recorded } from '@/lib/audit/recorded';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { LogReading, Run } from '@/lib/database/records';
import { notFound, Problem } from '@/lib/errors';
import type { NewReading } from './reading-schema';
import { requirePlausibleTime } from './run-times';
import { supersedeByReadings } from './supersede-by-readings';

export type ReadingsAdded = { run: string; count: number; firstAt: string; lastAt: string };

/** Adds log readings of a run in one go, with one audit event; those of a signed collection end its signature. By a chemist, or a token with `readings:write`. */
export async function addReadings(
  actor: Actor,
  runCode: string,
  readings: readonly NewReading[],
): Promise<ReadingsAdded> {
  // The row is not locked: readings of one run may come from a person and an instrument at once.
  const run = await Run.findOne({ where: { code: runCode, groupId: visibleGroupIds(actor) } });
  if (!run) throw notFound(`run ${runCode}`);
  authorise(actor, 'readings.write', run.groupId);
  const sender = senderOf(actor);
  const rows = readings.map((reading, at) => {
    const time = new Date(reading.at);
    requirePlausibleTime(`readings.${at}.at`, time);
    return { ...reading, ...sender, id: newId(), runId: run.id, at: time };
  });
  const times = rows.map((row) => row.at.getTime());
  const range = {
    count: rows.length,
    firstAt: new Date(times.reduce((a, b) => Math.min(a, b))).toISOString(),
    lastAt: new Date(times.reduce((a, b) => Math.max(a, b))).toISOString(),
  };
  await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    await LogReading.bulkCreate(rows, { transaction });
    record({
      type: 'readings.added',
      recordType: 'run',
      recordId: run.id,
      groupId: run.groupId,
      after: { run: run.code, ...range },
    });
    await supersedeByReadings(
      recorder,
      run.id,
      rows.map((row) => row.at),
    );
  });
  return { run: run.code, ...range };
}

function senderOf(actor: Actor): { sentByKind: 'user' | 'token'; sentById: string } {
  if (actor.kind === 'user') return { sentByKind: 'user', sentById: actor.userId };
  if (actor.kind === 'token') return { sentByKind: 'token', sentById: actor.tokenId };
  throw new Problem('not-allowed', 'Readings are sent by a person or by an instrument.');
}
