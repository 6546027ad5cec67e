import { Op } from 'sequelize';
import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { LiteratureValue, User } from '@/lib/database/records';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { presentLiteratureValue } from './present';
import { requireCompound } from './require-compound';
import type { LiteratureListQuery, LiteratureValueJson } from './schema';

/** Literature values of a compound, oldest first, replaced ones included unless asked otherwise. @throws Problem 404. */
export async function listLiterature(
  actor: Actor,
  compoundId: string,
  { property, inForce, cursor, limit }: LiteratureListQuery,
): Promise<Page<LiteratureValueJson>> {
  requirePerson(actor);
  await requireCompound(compoundId);
  const [afterId] = cursor ? decodeCursor('literature', cursor, ['id']) : [];
  const rows = await LiteratureValue.findAll({
    where: {
      compoundId,
      ...(property && { property }),
      ...(inForce && { replacedAt: inForce === 'true' ? null : { [Op.ne]: null } }),
      ...(afterId && { id: { [Op.gt]: afterId } }),
    } as never,
    order: [['id', 'ASC']],
    limit: limit + 1,
  });
  const names = await namesOf(rows);
  return toPage(
    rows,
    limit,
    (row) => presentLiteratureValue(row, names.get(row.addedById ?? '') ?? null),
    (row) => encodeCursor('literature', [row.id]),
  );
}

async function namesOf(rows: LiteratureValue[]): Promise<Map<string, string>> {
  const ids = [...new Set(rows.flatMap(({ addedById }) => addedById ?? []))];
  const users =
    ids.length === 0 ? [] : await User.findAll({ where: { id: ids }, attributes: ['id', 'name'] });
  return new Map(users.map(({ id, name }) => [id, name]));
}

/** Every literature value of a compound, for its page. */
export async function listAllLiterature(actor: Actor, compoundId: string): Promise<LiteratureValueJson[]> {
  const items: LiteratureValueJson[] = [];
  let cursor: string | undefined;
  do {
    const page: Page<LiteratureValueJson> = await listLiterature(actor, compoundId, { limit: 200, cursor });
    items.push(...page.items);
    cursor = page.nextCursor ?? undefined;
  } while (cursor);
  return items;
}
