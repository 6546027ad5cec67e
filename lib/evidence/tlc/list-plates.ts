import { Op } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { Plate, PlateLane } from '@/lib/database/records';
import { requireRun } from '@/lib/distillation/require-run';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { loadPlates } from './load-plate';
import type { PlateView } from './schema';

const sort = 'plates';

/** The plates of a run, the newest first. 404 for a run that the actor may not see. */
export async function listPlates(
  actor: Actor,
  runCode: string,
  { limit, cursor }: { limit: number; cursor?: string },
): Promise<Page<PlateView>> {
  const run = await requireRun(actor, runCode);
  const [at, id] = cursor ? decodeCursor(sort, cursor, ['instant', 'id']) : [];
  const after = at && id ? new Date(at) : null;
  const rows = await Plate.findAll({
    where: {
      runId: run.id,
      ...(after && {
        createdAt: { [Op.lte]: after },
        [Op.or]: [{ createdAt: { [Op.lt]: after } }, { id: { [Op.lt]: id! } }],
      }),
    },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: limit + 1,
  });
  const views = new Map((await loadPlates(rows)).map((view) => [view.id, view]));
  return toPage(
    rows,
    limit,
    (row) => views.get(row.id)!,
    (row) => encodeCursor(sort, [row.createdAt.toISOString(), row.id]),
  );
}

/** The plates that have a lane of a fraction, the newest first. */
export async function listPlatesOfFraction(actor: Actor, fractionId: string): Promise<PlateView[]> {
  const lanes = await PlateLane.findAll({ where: { fractionId }, attributes: ['plateId'] });
  const rows = await Plate.findAll({
    where: { id: [...new Set(lanes.map((lane) => lane.plateId))], groupId: visibleGroupIds(actor) },
    order: [['createdAt', 'DESC']],
  });
  return loadPlates(rows);
}
