import { LiteratureValue } from '@/lib/database/records';
import type { LiteratureValue as LiteratureValueRecord } from '@/models';
import type { LiteratureProperty } from './property-names';

/** The preferred value of a property that no correction has replaced, or null where none is kept. */
export async function findPreferredLiterature(
  compoundId: string,
  property: LiteratureProperty,
): Promise<LiteratureValueRecord | null> {
  return LiteratureValue.findOne({
    where: { compoundId, property, preferred: true, replacedAt: null },
    order: [['createdAt', 'DESC']],
  });
}

/** All values in force of the named properties of some compounds, the preferred one of each property first. */
export async function listLiteratureInForce(
  compoundIds: readonly string[],
  properties: readonly LiteratureProperty[],
): Promise<LiteratureValueRecord[]> {
  if (compoundIds.length === 0 || properties.length === 0) return [];
  return LiteratureValue.findAll({
    where: { compoundId: [...compoundIds], property: [...properties], replacedAt: null },
    order: [
      ['preferred', 'DESC'],
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
  });
}
