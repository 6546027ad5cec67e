import type { Transaction } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { Plate } from '@/lib/database/records';
import { notFound } from '@/lib/errors';
import { loadPlate } from './load-plate';
import type { PlateView } from './schema';

/** A plate that the actor's groups may see; 404 otherwise. */
export async function requirePlate(actor: Actor, id: string): Promise<Plate> {
  const plate = await Plate.findOne({ where: { id, groupId: visibleGroupIds(actor) } });
  if (!plate) throw notFound('plate with this id');
  return plate;
}

/** The same, its row locked until the transaction ends. Lock the run before it. */
export async function requirePlateForChange(
  actor: Actor,
  id: string,
  transaction: Transaction,
): Promise<Plate> {
  const plate = await Plate.findOne({
    where: { id, groupId: visibleGroupIds(actor) },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!plate) throw notFound('plate with this id');
  return plate;
}

export async function viewPlate(actor: Actor, id: string): Promise<PlateView> {
  return loadPlate(await requirePlate(actor, id));
}
