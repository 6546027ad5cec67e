import { Op } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { EvidenceFile, Fraction, Instrument, TrayItem } from '@/lib/database/records';
import { placesOf } from '@/lib/evidence/require-evidence';
import { Problem } from '@/lib/errors';
import { decodeCursor, encodeCursor, toPage } from '@/lib/http/paging';
import { presentTrayItem } from './present-tray-item';
import { trayGroups, whyNoTray } from './tray-policy';
import type { TrayPage } from './tray-schema';

const sort = 'tray';

/** The files that wait for their fraction, the newest first. 403 for who may empty no group's tray. */
export async function listTray(
  actor: Actor,
  { limit, cursor }: { limit: number; cursor?: string },
): Promise<TrayPage> {
  const reason = whyNoTray(actor);
  if (reason) throw new Problem('not-allowed', reason);
  const [at, id] = cursor ? decodeCursor(sort, cursor, ['instant', 'id']) : [];
  const after = at && id ? new Date(at) : null;
  const items = (await TrayItem.findAll({
    where: {
      groupId: trayGroups(actor),
      filedAt: null,
      ...(after && {
        createdAt: { [Op.lte]: after },
        [Op.or]: [{ createdAt: { [Op.lt]: after } }, { id: { [Op.lt]: id! } }],
      }),
    },
    include: [{ model: EvidenceFile, as: 'evidence' }],
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: limit + 1,
  })) as (TrayItem & { evidence: EvidenceFile })[];
  const instrumentIds = items.map((item) => item.instrumentId).filter((one) => one !== null);
  const [places, instruments] = await Promise.all([
    placesOf(items.map((item) => item.evidence)),
    Instrument.findAll({ where: { id: [...new Set(instrumentIds)] }, attributes: ['id', 'name'] }),
  ]);
  const names = new Map(instruments.map((instrument) => [instrument.id, instrument.name]));
  return toPage(
    items,
    limit,
    (item) =>
      presentTrayItem(
        item,
        item.evidence,
        places.get(item.evidence.id)!,
        names.get(item.instrumentId ?? '') ?? null,
      ),
    (item) => encodeCursor(sort, [item.createdAt.toISOString(), item.id]),
  );
}

/** Codes to choose from when a file is given its fraction: the latest of the actor's groups. */
export async function listRecentFractionCodes(actor: Actor, count = 100): Promise<string[]> {
  const fractions = await Fraction.findAll({
    where: { groupId: visibleGroupIds(actor) },
    attributes: ['code'],
    order: [['collectedAt', 'DESC']],
    limit: count,
  });
  return fractions.map((fraction) => fraction.code);
}
