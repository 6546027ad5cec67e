import type { Recorder } from '@/lib/audit/recorded';
import { newId } from '@/lib/database/ids';
import { type Fraction, FractionTransition, Signature } from '@/lib/database/records';

/**
 * Ends the force of the signatures on a fraction because `what` changed under them; they stay readable.
 * A signed-off fraction becomes `reopened`, a returned one goes back to work. Does nothing otherwise.
 */
export async function supersedeSignatures(
  recorder: Recorder,
  fraction: Fraction,
  what: string,
): Promise<void> {
  const { transaction, actor, record } = recorder;
  const step =
    fraction.status === 'signed off' ? 'supersede' : fraction.status === 'returned' ? 'resume' : null;
  if (!step) return;
  const at = new Date();
  const before = fraction.status;
  const after = step === 'supersede' ? 'reopened' : 'open';
  if (step === 'supersede') {
    await Signature.update(
      { supersededAt: at, supersededReason: what },
      { where: { fractionId: fraction.id, supersededAt: null }, transaction },
    );
  }
  await fraction.update({ status: after }, { transaction });
  await FractionTransition.create(
    {
      id: newId(),
      fractionId: fraction.id,
      action: step,
      fromStatus: before,
      toStatus: after,
      reason: what,
      actorId: actor.kind === 'user' ? actor.userId : null,
      actorName: actor.name,
      at,
    },
    { transaction },
  );
  record({
    type: step === 'supersede' ? 'fraction.signature_superseded' : 'fraction.resumed',
    recordType: 'fraction',
    recordId: fraction.id,
    groupId: fraction.groupId,
    before: { status: before },
    after: { status: after },
    reason: what,
  });
}
