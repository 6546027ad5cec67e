import { judgeFraction } from '@/lib/acceptance/judge-fraction';
import { findSpecificationInForce } from '@/lib/acceptance/find-specification';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import type { Fraction } from '@/lib/database/records';
import { lockForStep, writeTransition } from './take-step';
import { tellPeople } from './tell-people';

/**
 * Hands a fraction to the analysts of its group. From here on it keeps the specification edition that is in
 * force now. It may be incomplete: the analyst adds what a chemist does not measure.
 */
export async function submitFraction(
  actor: Actor,
  code: string,
  input: { comment?: string | undefined; version: number | null },
): Promise<Fraction> {
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const step = { action: 'submit', right: 'fraction.submit', version: input.version } as const;
    const fraction = await lockForStep(recorder, code, step);
    const from = fraction.status;
    const specification = await findSpecificationInForce(fraction.groupId, fraction.compoundId, transaction);
    await fraction.update(
      { status: 'submitted', specificationId: specification?.id ?? null },
      { transaction },
    );
    const reason = input.comment || null;
    await writeTransition(recorder, fraction, { action: 'submit', from, to: 'submitted', reason });
    record({
      type: 'fraction.submitted',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: fraction.groupId,
      before: { status: from },
      after: { status: 'submitted', specificationId: fraction.specificationId },
      reason,
    });
    await judgeFraction(recorder, fraction);
    await tellPeople(recorder, fraction, {
      kind: 'fraction.submitted',
      roles: ['analyst'],
      subject: `${fraction.code} was submitted`,
      lines: [
        `${actor.name} submitted fraction ${fraction.code}. Its verdict is ${fraction.verdictState}.`,
        ...(reason ? [`They say: ${reason}`] : []),
      ],
    });
    return fraction;
  });
}
