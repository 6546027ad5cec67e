import { judgeFraction } from '@/lib/acceptance/judge-fraction';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { type Fraction, Signature } from '@/lib/database/records';
import { lockForStep, writeTransition } from './take-step';
import { tellPeople } from './tell-people';

/** Takes back the release of a signed-off fraction: its signatures stay readable, superseded with the reason. */
export async function reopenFraction(
  actor: Actor,
  code: string,
  input: { reason: string; version: number | null },
): Promise<Fraction> {
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const step = { action: 'reopen', right: 'fraction.reopen', version: input.version } as const;
    const fraction = await lockForStep(recorder, code, step);
    const at = new Date();
    await Signature.update(
      { supersededAt: at, supersededReason: input.reason },
      { where: { fractionId: fraction.id, supersededAt: null }, transaction },
    );
    await fraction.update({ status: 'reopened' }, { transaction });
    await writeTransition(recorder, fraction, {
      action: 'reopen',
      from: 'signed off',
      to: 'reopened',
      reason: input.reason,
      at,
    });
    record({
      type: 'fraction.reopened',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: fraction.groupId,
      before: { status: 'signed off' },
      after: { status: 'reopened' },
      reason: input.reason,
    });
    await judgeFraction(recorder, fraction);
    await tellPeople(recorder, fraction, {
      kind: 'fraction.reopened',
      roles: ['pi'],
      userIds: [fraction.collectedById],
      subject: `${fraction.code} was reopened`,
      lines: [
        `${actor.name} reopened fraction ${fraction.code}; its signature no longer holds.`,
        input.reason,
      ],
    });
    return fraction;
  });
}
