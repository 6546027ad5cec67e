import { Op, type Transaction } from 'sequelize';
import { type Fraction, Specification } from '@/lib/database/records';
import { criteriaSchema } from './criteria/registry';
import type { SpecificationInput } from './judge-inputs';

/** The edition approved last for a compound in a group; null when a PI has approved none. */
export async function findSpecificationInForce(
  groupId: string,
  compoundId: string,
  transaction?: Transaction,
): Promise<Specification | null> {
  return Specification.findOne({
    where: { groupId, compoundId, approvedAt: { [Op.ne]: null } },
    order: [
      ['approvedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    transaction,
  });
}

/**
 * The edition that a fraction is judged by: once submitted it keeps the one it was submitted under; before
 * that, the one in force.
 */
export async function findSpecificationOf(
  fraction: Fraction,
  transaction?: Transaction,
): Promise<Specification | null> {
  const kept = fraction.status === 'submitted' || fraction.status === 'signed off';
  if (kept && fraction.specificationId)
    return Specification.findByPk(fraction.specificationId, { transaction });
  return findSpecificationInForce(fraction.groupId, fraction.compoundId, transaction);
}

export function specificationInput(row: Specification): SpecificationInput {
  return {
    id: row.id,
    grade: row.grade,
    edition: row.edition,
    decisionRule: row.decisionRule,
    criteria: criteriaSchema.parse(row.criteria),
  };
}
