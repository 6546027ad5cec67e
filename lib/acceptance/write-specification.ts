import { recorded } from '@/lib/audit/recorded';
import { type Actor, type UserActor, visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { requirePerson } from '@/lib/auth/require-person';
import { requireCompound, requireCompoundForChange } from '@/lib/compounds/require-compound';
import { newId } from '@/lib/database/ids';
import { Specification } from '@/lib/database/records';
import { invalidField, Problem } from '@/lib/errors';
import { presentSpecifications } from './present-specification';
import { rejudgeOpenFractions } from './rejudge-open-fractions';
import type { NewSpecification, SpecificationJson } from './specification-schema';

/** The group that a PI writes for: the one asked for, or the only one where the caller is PI. */
function groupToWriteFor(actor: UserActor, asked: string | undefined): string {
  if (asked !== undefined) {
    if (!visibleGroupIds(actor).includes(asked))
      throw invalidField('group', 'There is no such group that you can see. Give the id of one of yours.');
    authorise(actor, 'specification.write', asked);
    return asked;
  }
  const groups = [...new Set(actor.memberships.filter((one) => one.role === 'pi').map((one) => one.groupId))];
  if (groups.length === 1) return groups[0] as string;
  if (groups.length === 0)
    throw new Problem('not-allowed', 'Only a PI can write a specification. Ask the PI of your group.');
  throw invalidField('group', 'You are PI of several groups. Say which one with "group".');
}

/**
 * Writes a new edition of a grade. Older editions stay as they are, and fractions that were submitted under one
 * keep it. With `approve` it is in force at once, and the group's open fractions are judged by it.
 */
export async function writeSpecification(
  actor: Actor,
  compoundId: string,
  input: NewSpecification,
): Promise<SpecificationJson> {
  const person = requirePerson(actor);
  await requireCompound(compoundId);
  const groupId = groupToWriteFor(person, input.group);
  const row = await recorded(actor, async ({ transaction, record }) => {
    // Editions of one compound are numbered under its lock, without gaps or doubles.
    await requireCompoundForChange(compoundId, transaction);
    const where = { groupId, compoundId, grade: input.grade };
    const last = await Specification.max<number | null, Specification>('edition', { where, transaction });
    const now = new Date();
    const made = await Specification.create(
      {
        id: newId(),
        ...where,
        edition: (last ?? 0) + 1,
        decisionRule: input.decisionRule,
        criteria: input.criteria,
        note: input.note || null,
        writtenById: person.userId,
        approvedById: input.approve ? person.userId : null,
        approvedAt: input.approve ? now : null,
      },
      { transaction },
    );
    const event = { recordType: 'specification', recordId: made.id, groupId };
    const after = { compoundId, grade: made.grade, edition: made.edition, criteria: input.criteria };
    record({ ...event, type: 'specification.written', after: { ...after, decisionRule: made.decisionRule } });
    if (input.approve)
      record({
        ...event,
        type: 'specification.approved',
        after: { grade: made.grade, edition: made.edition },
      });
    return made;
  });
  if (input.approve) await rejudgeOpenFractions(actor, { groupId, compoundId });
  const [presented] = await presentSpecifications([await row.reload()]);
  return presented as SpecificationJson;
}
