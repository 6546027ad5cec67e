import type { Recorder } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import type { Action } from '@/lib/auth/role-table';
import { newId } from '@/lib/database/ids';
import { type Fraction, FractionTransition } from '@/lib/database/records';
import { type FractionAction, type FractionStatus, whyNotInState } from '@/lib/distillation/fraction-states';
import { requireFractionForChange } from '@/lib/distillation/require-fraction';
import { Problem } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';

/**
 * The fraction's row, locked, for a step of its life: 404 for what the actor may not see, 403 by role, 409
 * for a version that has moved on (when one was sent) or a state in which the step is not possible.
 */
export async function lockForStep(
  recorder: Recorder,
  code: string,
  step: { action: FractionAction; right: Action; version: number | null },
): Promise<Fraction> {
  const fraction = await requireFractionForChange(recorder.actor, code, recorder.transaction);
  authorise(recorder.actor, step.right, fraction.groupId);
  if (step.version !== null) requireSameVersion(fraction, step.version);
  const hindrance = whyNotInState(step.action, fraction.status);
  if (hindrance) throw new Problem('state-conflict', hindrance);
  return fraction;
}

function actorIdOf(actor: Actor): string | null {
  return actor.kind === 'user' ? actor.userId : null;
}

/** Keeps a step of the fraction's life: who, when, from which state to which, and why. */
export async function writeTransition(
  { transaction, actor }: Recorder,
  fraction: Fraction,
  step: {
    action: 'submit' | 'return' | 'sign off' | 'reopen';
    from: FractionStatus;
    to: FractionStatus;
    reason: string | null;
    at?: Date;
  },
): Promise<void> {
  await FractionTransition.create(
    {
      id: newId(),
      fractionId: fraction.id,
      action: step.action,
      fromStatus: step.from,
      toStatus: step.to,
      reason: step.reason,
      actorId: actorIdOf(actor),
      actorName: actor.name,
      at: step.at ?? new Date(),
    },
    { transaction },
  );
}
