import { Op } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { Fraction } from '@/lib/database/records';

export type PurityPoint = { code: string; purityPercent: number; verdict: string; collectedAt: string };

/** More points than this cannot be told apart on a phone. */
const SHOWN = 40;

/** GC purity (area %) of the actor's groups' latest heart cuts of a compound, oldest first. */
export async function listPurityTrend(actor: Actor, compoundId: string): Promise<PurityPoint[]> {
  const fractions = await Fraction.findAll({
    where: {
      compoundId,
      groupId: visibleGroupIds(actor),
      cut: 'heart',
      purityPercent: { [Op.ne]: null },
    } as never,
    order: [
      ['collectedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: SHOWN,
  });
  return fractions.reverse().map(({ code, purityPercent, verdictState, collectedAt }) => ({
    code,
    purityPercent: purityPercent!,
    verdict: verdictState,
    collectedAt: collectedAt.toISOString(),
  }));
}
