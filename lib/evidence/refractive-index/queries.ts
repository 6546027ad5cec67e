import { Op } from 'sequelize';
import type { Actor } from '@/lib/auth/actor';
import { RefractiveReading } from '@/lib/database/records';
import { requireFraction } from '@/lib/distillation/require-fraction';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { presentRefractiveReading } from './present';
import type { RefractiveReadingJson, RefractiveReadingListQuery } from './schema';

/** Refractometer readings of a fraction, the newest first; 404 for a fraction that is not visible. */
export async function listRefractiveReadings(
  actor: Actor,
  fractionCode: string,
  { limit, cursor }: RefractiveReadingListQuery,
): Promise<Page<RefractiveReadingJson>> {
  const fraction = await requireFraction(actor, fractionCode);
  const rows = await RefractiveReading.findAll({
    where: { fractionId: fraction.id, ...(cursor === undefined ? {} : after(cursor)) },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: limit + 1,
  });
  return toPage(
    rows,
    limit,
    (row) => presentRefractiveReading(row, fraction.code),
    (row) => encodeCursor('-createdAt', [row.createdAt.toISOString(), row.id]),
  );
}

function after(cursor: string) {
  const [at, id] = decodeCursor('-createdAt', cursor, ['instant', 'id']);
  const time = new Date(at);
  return {
    createdAt: { [Op.lte]: time },
    [Op.or]: [{ createdAt: { [Op.lt]: time } }, { id: { [Op.lt]: id } }],
  };
}
