import type { Transaction } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { Compound, Fraction, Run, User } from '@/lib/database/records';
import { notFound } from '@/lib/errors';

export type FractionWithRun = Fraction & { run: Run; compound: Compound; collectedBy: User };

/** A fraction that the actor's groups may see, with run, compound and who collected it; 404 otherwise. */
export async function requireFraction(actor: Actor, code: string): Promise<FractionWithRun> {
  const fraction = await Fraction.findOne({
    where: { code, groupId: visibleGroupIds(actor) },
    include: [
      { model: Run, as: 'run' },
      { model: Compound, as: 'compound' },
      { model: User, as: 'collectedBy' },
    ],
  });
  if (!fraction) throw notFound(`fraction ${code}`);
  return fraction as FractionWithRun;
}

/**
 * The fraction's row, locked until the transaction ends; 404 as above. Everything that changes a
 * fraction or what lies under it starts here, so that changes of one fraction queue up.
 */
export async function requireFractionForChange(
  actor: Actor,
  code: string,
  transaction: Transaction,
): Promise<Fraction> {
  const fraction = await Fraction.findOne({
    where: { code, groupId: visibleGroupIds(actor) },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!fraction) throw notFound(`fraction ${code}`);
  return fraction;
}
