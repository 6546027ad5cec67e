import type { Transaction } from 'sequelize';
import { casNumberProblem, parseCasNumber } from '@/lib/compounds/cas-number';
import { isId } from '@/lib/database/ids';
import { Compound } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';

/**
 * The compound that a body names by id or CAS number; a 422 that names the field when it is unknown or
 * mistyped. `path` is the field as sent, for example `knownImpurities.0`.
 */
export async function resolveCompound(
  reference: string,
  path: string,
  transaction: Transaction,
): Promise<Compound> {
  if (isId(reference)) {
    const compound = await Compound.findByPk(reference, { transaction });
    if (compound) return compound;
    throw invalidField(path, 'There is no compound with this id. Find it under Compounds first.');
  }
  const casNumber = parseCasNumber(reference);
  if (!casNumber) throw invalidField(path, `Give an id or a CAS number. ${casNumberProblem(reference)}`);
  const compound = await Compound.findOne({ where: { casNumber }, transaction });
  if (compound) return compound;
  throw invalidField(path, `No compound has the CAS number ${casNumber}. A PI can add it under Compounds.`);
}

/** Known impurities, each once, in the order given; 422 when one is the target itself. */
export async function resolveImpurities(
  references: readonly string[],
  target: { id: string; name: string },
  transaction: Transaction,
): Promise<Compound[]> {
  const found = new Map<string, Compound>();
  for (const [at, reference] of references.entries()) {
    const path = `knownImpurities.${at}`;
    const compound = await resolveCompound(reference, path, transaction);
    if (compound.id === target.id) {
      throw invalidField(path, `${target.name} is the target; an impurity is another compound.`);
    }
    found.set(compound.id, compound);
  }
  return [...found.values()];
}
