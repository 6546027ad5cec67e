import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { CompoundSynonym, type Compound } from '@/lib/database/records';
import { listLiteratureInForce } from './find-literature';
import { plateOutlook } from './plate-outlook';
import { presentCompound } from './present';
import { requireCompound } from './require-compound';
import type { CompoundJson } from './schema';

/** A compound with its synonyms, hazards and what a plate can show of it. @throws Problem 403 for a token, 404. */
export async function readCompound(actor: Actor, id: string): Promise<CompoundJson> {
  requirePerson(actor);
  return describeCompound(await requireCompound(id));
}

/** As readCompound, for a row that is at hand. */
export async function describeCompound(compound: Compound): Promise<CompoundJson> {
  const [synonyms, rows] = await Promise.all([
    CompoundSynonym.findAll({ where: { compoundId: compound.id }, order: [['name', 'ASC']] }),
    listLiteratureInForce([compound.id], ['normal boiling point', 'flash point', 'autoignition temperature']),
  ]);
  const preferred = rows.filter((row) => row.preferred);
  const boilingPoint = preferred.find(({ property }) => property === 'normal boiling point');
  const outlook = await plateOutlook(compound.smiles, boilingPoint?.value ?? null);
  return presentCompound(compound, synonyms, preferred, outlook);
}
