import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import type { Fraction } from '@/lib/database/records';
import { lockForStep, writeTransition } from './take-step';
import { tellPeople } from './tell-people';

/** Sends a submitted fraction back to whoever collected it, with what has to be done. */
export async function returnFraction(
  actor: Actor,
  code: string,
  input: { reason: string; version: number | null },
): Promise<Fraction> {
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const step = { action: 'return', right: 'fraction.return', version: input.version } as const;
    const fraction = await lockForStep(recorder, code, step);
    await fraction.update({ status: 'returned' }, { transaction });
    await writeTransition(recorder, fraction, {
      action: 'return',
      from: 'submitted',
      to: 'returned',
      reason: input.reason,
    });
    record({
      type: 'fraction.returned',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: fraction.groupId,
      before: { status: 'submitted' },
      after: { status: 'returned' },
      reason: input.reason,
    });
    await tellPeople(recorder, fraction, {
      kind: 'fraction.returned',
      roles: [],
      userIds: [fraction.collectedById],
      subject: `${fraction.code} came back`,
      lines: [`${actor.name} returned fraction ${fraction.code}:`, input.reason],
    });
    return fraction;
  });
}
