import { Group, Specification, User } from '@/lib/database/records';
import { criteriaSchema } from './criteria/registry';
import { findSpecificationInForce } from './find-specification';
import type { SpecificationJson } from './specification-schema';

/** Specification rows as JSON, with names in place of ids, and which of them is in force. */
export async function presentSpecifications(rows: Specification[]): Promise<SpecificationJson[]> {
  const groups = await Group.findAll({ where: { id: [...new Set(rows.map((row) => row.groupId))] } });
  const userIds = rows.flatMap((row) => [row.writtenById, row.approvedById ?? row.writtenById]);
  const users = await User.findAll({ where: { id: [...new Set(userIds)] } });
  const nameOf = (id: string) => users.find((user) => user.id === id)?.name ?? 'somebody';
  const inForce = new Set<string>();
  for (const groupId of new Set(rows.map((row) => row.groupId))) {
    const compoundIds = new Set(rows.filter((row) => row.groupId === groupId).map((row) => row.compoundId));
    for (const compoundId of compoundIds) {
      const latest = await findSpecificationInForce(groupId, compoundId);
      if (latest) inForce.add(latest.id);
    }
  }
  return rows.map((row) => ({
    id: row.id,
    group: { id: row.groupId, name: groups.find((group) => group.id === row.groupId)?.name ?? '' },
    compoundId: row.compoundId,
    grade: row.grade,
    edition: row.edition,
    decisionRule: row.decisionRule,
    criteria: criteriaSchema.parse(row.criteria),
    note: row.note,
    writtenBy: nameOf(row.writtenById),
    approvedBy: row.approvedById ? nameOf(row.approvedById) : null,
    approvedAt: row.approvedAt?.toISOString() ?? null,
    inForce: inForce.has(row.id),
    createdAt: row.createdAt.toISOString(),
    version: row.version,
  }));
}
