import { vapourPressureDataOf } from '@/lib/acceptance/vapour-pressure-of';
import { Compound } from '@/lib/database/records';
import type { VapourPressureData } from '@/lib/distillation/boiling-point/vapour-pressure-data';
import { notFound, Problem } from '@/lib/errors';
import { listLiteratureInForce } from './find-literature';
import { structureFeatures } from './structure';

/**
 * What is known of a compound's vapour pressure: its preferred normal boiling point and its sets of coefficients in
 * force, for boilingPointAtPressure and separation. Null for an unknown compound or one without a normal boiling point.
 */
export async function findVapourPressureData(compoundId: string): Promise<VapourPressureData | null> {
  const compound = await Compound.findByPk(compoundId);
  if (!compound) return null;
  const values = await listLiteratureInForce(
    [compoundId],
    ['normal boiling point', 'Antoine coefficients', 'Wagner coefficients'],
  );
  const groups = compound.smiles === null ? null : await structureFeatures(compound.smiles).catch(() => null);
  return vapourPressureDataOf(compound, values, groups);
}

/** As findVapourPressureData. @throws Problem 404 for an unknown compound, 422 without a normal boiling point. */
export async function requireVapourPressureData(compoundId: string): Promise<VapourPressureData> {
  const data = await findVapourPressureData(compoundId);
  if (data) return data;
  const compound = await Compound.findByPk(compoundId);
  if (!compound) throw notFound('compound');
  throw new Problem(
    'invalid',
    `No normal boiling point is kept for ${compound.name}. Add one with its source to the compound first.`,
  );
}
