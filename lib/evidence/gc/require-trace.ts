import type { Transaction } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { EvidenceFile, Fraction, Run, Trace } from '@/lib/database/records';
import { whyNotInState } from '@/lib/distillation/fraction-states';
import { requireFractionForChange } from '@/lib/distillation/require-fraction';
import { requireRunForChange } from '@/lib/distillation/require-run';
import { notFound, Problem } from '@/lib/errors';

/** A trace with what it hangs on. */
export type TraceWithPlace = { trace: Trace; evidence: EvidenceFile; run: Run; fraction: Fraction | null };

/** A trace that the actor's groups may see, with its file, run and fraction; 404 otherwise. */
export async function requireTrace(actor: Actor, id: string): Promise<TraceWithPlace> {
  const trace = await Trace.findOne({ where: { id, groupId: visibleGroupIds(actor) } });
  if (!trace) throw notFound('trace');
  return { trace, ...(await placeOf(trace)) };
}

async function placeOf(trace: Trace): Promise<Omit<TraceWithPlace, 'trace'>> {
  const [evidence, run, fraction] = await Promise.all([
    EvidenceFile.findByPk(trace.evidenceId),
    Run.findByPk(trace.runId),
    trace.fractionId ? Fraction.findByPk(trace.fractionId) : null,
  ]);
  if (!evidence || !run) throw new Error(`Trace ${trace.id} has lost its file or run`);
  return { evidence, run, fraction };
}

/** What a trace hangs on, locked until the transaction ends: its fraction, else its run. 409 in a state that forbids it. */
export type LockedPlace = { fraction: Fraction; run: null } | { fraction: null; run: Run };

export async function lockPlace(
  actor: Actor,
  place: { fractionCode: string | null; runCode: string },
  transaction: Transaction,
): Promise<LockedPlace> {
  if (place.fractionCode === null)
    return { fraction: null, run: await requireRunForChange(actor, place.runCode, transaction) };
  const fraction = await requireFractionForChange(actor, place.fractionCode, transaction);
  const reason = whyNotInState('change', fraction.status);
  if (reason) throw new Problem('state-conflict', reason);
  return { fraction, run: null };
}

/** The trace's row alone, locked: versions of its integration are counted under it. Lock its place first. */
export async function requireTraceForChange(id: string, transaction: Transaction): Promise<Trace> {
  const trace = await Trace.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  if (!trace) throw notFound('trace');
  return trace;
}
