import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { EvidenceFile, Fraction, Run } from '@/lib/database/records';
import { requireFraction } from '@/lib/distillation/require-fraction';
import { requireRun } from '@/lib/distillation/require-run';
import { invalidField, notFound } from '@/lib/errors';
import { kindFacts } from '../kinds';
import type { NewTrace } from './schema';

export type TracePlace = { evidence: EvidenceFile; run: Run; fraction: Fraction | null };

/** An evidence file that the actor's groups may see and that may hold a trace; 404, or 422 for another kind of file. */
export async function requireTraceFile(actor: Actor, id: string): Promise<EvidenceFile> {
  const evidence = await EvidenceFile.findOne({ where: { id, groupId: visibleGroupIds(actor) } });
  if (!evidence) throw notFound('evidence file');
  if (!kindFacts['gc-trace'].mediaTypes.includes(evidence.mediaType)) {
    throw invalidField(
      'evidenceId',
      `${evidence.fileName} is ${evidence.mediaType}, not a trace. Choose a table of time and signal (CSV or TSV).`,
    );
  }
  return evidence;
}

/** Where a trace belongs: what the body says, else where its file was stored. 404 and 422 name what does not fit. */
export async function findTracePlace(actor: Actor, body: NewTrace): Promise<TracePlace> {
  const evidence = await requireTraceFile(actor, body.evidenceId);
  if (!evidence.runId)
    throw invalidField(
      'evidenceId',
      'This file waits in the tray. Give it its fraction there first, then read it.',
    );
  const fraction = await findFraction(actor, body, evidence);
  const run = fraction ? await Run.findByPk(fraction.runId) : await findRun(actor, body, evidence);
  if (!run) throw notFound('run');
  if (fraction && body.run !== undefined && body.run !== run.code)
    throw invalidField('fraction', `${fraction.code} is not a fraction of the run ${body.run}.`);
  if (evidence.runId !== run.id)
    throw invalidField(
      'evidenceId',
      `This file was stored for another run than ${run.code}. Send it for this run.`,
    );
  if (body.subject === 'fraction' && fraction && evidence.fractionId && evidence.fractionId !== fraction.id)
    throw invalidField(
      'fraction',
      `This file was stored for another fraction than ${fraction.code}. Send it for this fraction.`,
    );
  return { evidence, run, fraction };
}

async function findFraction(actor: Actor, body: NewTrace, evidence: EvidenceFile): Promise<Fraction | null> {
  if (body.fraction !== undefined) return requireFraction(actor, body.fraction);
  if (body.subject !== 'fraction') return null;
  if (evidence.fractionId) return Fraction.findByPk(evidence.fractionId);
  throw invalidField('fraction', 'Say of which fraction this is the trace: "fraction": "<code>".');
}

async function findRun(actor: Actor, body: NewTrace, evidence: EvidenceFile): Promise<Run | null> {
  return body.run !== undefined ? requireRun(actor, body.run) : Run.findByPk(evidence.runId!);
}
