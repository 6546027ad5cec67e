import { Op } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { requireCompound } from '@/lib/compounds/require-compound';
import { Specification } from '@/lib/database/records';
import { decodeCursor, encodeCursor, type Page } from '@/lib/http/paging';
import { presentSpecifications } from './present-specification';
import type { SpecificationJson } from './specification-schema';

const sort = 'specifications:newest';

/** The editions for a compound in the actor's groups, the newest first. Ids sort by time. */
export async function listSpecifications(
  actor: Actor,
  compoundId: string,
  { limit, cursor }: { limit: number; cursor?: string | undefined },
): Promise<Page<SpecificationJson>> {
  requirePerson(actor);
  await requireCompound(compoundId);
  const after = cursor ? (decodeCursor(sort, cursor, ['id'])[0] as string) : null;
  const rows = await Specification.findAll({
    where: {
      compoundId,
      groupId: visibleGroupIds(actor),
      ...(after ? { id: { [Op.lt]: after } } : {}),
    },
    order: [['id', 'DESC']],
    limit: limit + 1,
  });
  const items = await presentSpecifications(rows.slice(0, limit));
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last ? encodeCursor(sort, [last.id]) : null };
}
