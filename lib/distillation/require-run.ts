import type { Transaction } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { Compound, Group, Run, User } from '@/lib/database/records';
import { notFound } from '@/lib/errors';

export type RunWithPeople = Run & { target: Compound; chemist: User; impurities: Compound[]; group: Group };

/** A run that the actor's groups may see, with target, impurities, chemist and group; 404 otherwise. */
export async function requireRun(actor: Actor, code: string): Promise<RunWithPeople> {
  const run = await Run.findOne({
    where: { code, groupId: visibleGroupIds(actor) },
    include: [
      { model: Compound, as: 'target' },
      { model: User, as: 'chemist' },
      { model: Group, as: 'group' },
      { model: Compound, as: 'impurities', through: { attributes: [] } },
    ],
  });
  if (!run) throw notFound(`run ${code}`);
  return run as RunWithPeople;
}

/** The run's row alone, locked until the transaction ends; 404 as above. Take it before its fractions. */
export async function requireRunForChange(
  actor: Actor,
  code: string,
  transaction: Transaction,
): Promise<Run> {
  const run = await Run.findOne({
    where: { code, groupId: visibleGroupIds(actor) },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!run) throw notFound(`run ${code}`);
  return run;
}
