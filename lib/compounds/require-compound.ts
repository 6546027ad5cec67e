import { type Transaction } from 'sequelize';
import { Compound, LiteratureValue } from '@/lib/database/records';
import { isId } from '@/lib/database/ids';
import { notFound } from '@/lib/errors';

/** A compound with its synonyms. Compounds are shared by all groups; 404 where there is none of this id. */
export async function requireCompound(id: string): Promise<Compound> {
  const compound = isId(id) ? await Compound.findByPk(id) : null;
  if (!compound) throw notFound('compound');
  return compound;
}

/** The compound's row, locked until the transaction ends: changes to it and to its literature queue here. */
export async function requireCompoundForChange(id: string, transaction: Transaction): Promise<Compound> {
  const compound = await Compound.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  if (!compound) throw notFound('compound');
  return compound;
}

/** A literature value of this compound, to be changed under the lock of its compound; 404 otherwise. */
export async function requireLiteratureValue(
  compoundId: string,
  id: string,
  transaction: Transaction,
): Promise<LiteratureValue> {
  const row = await LiteratureValue.findOne({ where: { id, compoundId }, transaction });
  if (!row) throw notFound('literature value of this compound');
  return row;
}
