import type { Actor } from '@/lib/auth/actor';
import { visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Fraction, Run } from '@/lib/database/records';
import { invalidField, notFound } from '@/lib/errors';
import type { UploadQuery } from './schema';

/** Where an upload goes. In the tray `askedFor` is what the sender said and `reason` why it waits. */
export type Destination =
  | { kind: 'fraction'; groupId: string; runId: string; fractionCode: string }
  | { kind: 'run'; groupId: string; runId: string }
  | { kind: 'tray'; groupId: string; askedFor: string | null; reason: string };

function tray(actor: Actor & { kind: 'token' }, askedFor: string | null, reason: string): Destination {
  return { kind: 'tray', groupId: actor.groupId, askedFor, reason };
}

/**
 * Decides where an upload goes, before its bytes are read. A person must name a fraction or run that they can see
 * (404, 422); an instrument's file is never refused for that, it waits in the tray. 403 without the right.
 */
export async function findDestination(actor: Actor, query: UploadQuery): Promise<Destination> {
  if (actor.kind === 'token') authorise(actor, 'evidence.write', actor.groupId);
  const groupId = visibleGroupIds(actor);
  const asked = query.fraction ?? query.run ?? null;
  const run = query.run ? await Run.findOne({ where: { code: query.run, groupId } }) : null;
  const fraction = query.fraction
    ? await Fraction.findOne({ where: { code: query.fraction, groupId } })
    : null;

  if (query.fraction && !fraction) {
    if (actor.kind === 'token') return tray(actor, asked, `There is no fraction ${query.fraction}.`);
    throw notFound(`fraction ${query.fraction}`);
  }
  if (query.run && !run) {
    if (actor.kind === 'token') return tray(actor, asked, `There is no run ${query.run}.`);
    throw notFound(`run ${query.run}`);
  }
  if (fraction && run && fraction.runId !== run.id) {
    if (actor.kind === 'token')
      return tray(actor, asked, `${query.fraction} is not a fraction of the run ${query.run}.`);
    throw invalidField('fraction', `${query.fraction} is not a fraction of the run ${query.run}.`);
  }
  const record = fraction ?? run;
  if (!record) {
    if (actor.kind === 'token')
      return tray(actor, null, 'The sender did not say which fraction it belongs to.');
    throw invalidField('fraction', 'Say where the file belongs: ?fraction=<code> or ?run=<code>.');
  }
  authorise(actor, 'evidence.write', record.groupId);
  return fraction
    ? { kind: 'fraction', groupId: fraction.groupId, runId: fraction.runId, fractionCode: fraction.code }
    : { kind: 'run', groupId: record.groupId, runId: record.id };
}
