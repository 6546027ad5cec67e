import { recorded } from '@/lib/audit/recorded';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { requirePerson } from '@/lib/auth/require-person';
import { isId } from '@/lib/database/ids';
import { Specification } from '@/lib/database/records';
import { notFound, Problem } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';
import { presentSpecifications } from './present-specification';
import { rejudgeOpenFractions } from './rejudge-open-fractions';
import type { SpecificationJson } from './specification-schema';

/** A PI puts an edition in force; only once, and nothing else of it ever changes. */
export async function approveSpecification(
  actor: Actor,
  id: string,
  version: number,
): Promise<SpecificationJson> {
  const person = requirePerson(actor);
  const row = await recorded(actor, async ({ transaction, record }) => {
    const found = isId(id)
      ? await Specification.findOne({
          where: { id, groupId: visibleGroupIds(actor) },
          transaction,
          lock: transaction.LOCK.UPDATE,
        })
      : null;
    if (!found) throw notFound('specification');
    authorise(actor, 'specification.write', found.groupId);
    requireSameVersion(found, version);
    if (found.approvedAt)
      throw new Problem(
        'state-conflict',
        'This edition is approved already. Write a new one to change a limit.',
      );
    await found.update({ approvedById: person.userId, approvedAt: new Date() }, { transaction });
    record({
      type: 'specification.approved',
      recordType: 'specification',
      recordId: found.id,
      groupId: found.groupId,
      after: { grade: found.grade, edition: found.edition },
    });
    return found;
  });
  await rejudgeOpenFractions(actor, row);
  const [presented] = await presentSpecifications([row]);
  return presented as SpecificationJson;
}
