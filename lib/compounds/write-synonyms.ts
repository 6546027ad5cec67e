import type { Transaction } from 'sequelize';
import { newId } from '@/lib/database/ids';
import { Compound, CompoundSynonym } from '@/lib/database/records';
import { Problem } from '@/lib/errors';

/** Names once each, as the database compares them: without regard to case and accents. */
export function distinctNames(names: readonly string[], besides: string): string[] {
  const same = (one: string, other: string) => one.localeCompare(other, 'en', { sensitivity: 'base' }) === 0;
  return names.filter((name, at) => ![besides, ...names.slice(0, at)].some((earlier) => same(earlier, name)));
}

/** Replaces the synonyms of a compound whose row is locked. @returns the names kept. */
export async function writeSynonyms(
  compound: Compound,
  names: readonly string[],
  transaction: Transaction,
): Promise<string[]> {
  const kept = distinctNames(names, compound.name);
  await CompoundSynonym.destroy({ where: { compoundId: compound.id }, transaction });
  await CompoundSynonym.bulkCreate(
    kept.map((name) => ({ id: newId(), compoundId: compound.id, name })),
    { transaction },
  );
  return kept;
}

/** 409 that names the compound which has this name or CAS number already. */
export async function requireUnusedIdentity(
  identity: { name?: string; casNumber?: string | null },
  ownId: string | null,
  transaction: Transaction,
): Promise<void> {
  const where = [
    ...(identity.name ? [{ name: identity.name }] : []),
    ...(identity.casNumber ? [{ casNumber: identity.casNumber }] : []),
  ];
  for (const condition of where) {
    const other = await Compound.findOne({ where: condition, transaction });
    if (!other || other.id === ownId) continue;
    const shared =
      'name' in condition ? `the name ${condition.name}` : `the CAS number ${condition.casNumber}`;
    throw new Problem('already-exists', `${other.name} has ${shared} already. Open it and change it there.`);
  }
}
