import { findPreferredLiterature } from '@/lib/compounds/find-literature';
import { isSodiumD, USUAL_INDEX_FALL_PER_C } from './correct-index';

/** The literature value of a compound's index that readings are compared with. */
export type LiteratureIndex = {
  valueId: string;
  n: number;
  temperatureC: number;
  /** Half-width within which the publication gives it; null where it says nothing. */
  halfWidth: number | null;
  source: string;
};

/** How the index falls with temperature, per °C; `uncertaintyPerC` null: the usual one. */
export type IndexFall = { fallPerC: number; uncertaintyPerC: number | null; source: string };

/** Half the last of the five places in which published coefficients are given (common practice). */
const PUBLISHED_FALL_UNCERTAINTY = 0.5e-5;

/** The preferred refractive index at the sodium D line, or null where none is kept that can be compared. */
export async function findLiteratureIndex(compoundId: string): Promise<LiteratureIndex | null> {
  const row = await findPreferredLiterature(compoundId, 'refractive index');
  if (!row || row.value === null || row.temperatureC === null) return null;
  if (row.wavelengthNm !== null && !isSodiumD(row.wavelengthNm)) return null;
  return {
    valueId: row.id,
    n: row.value,
    temperatureC: row.temperatureC,
    halfWidth: row.uncertainty,
    source: row.source,
  };
}

/** The compound's own temperature coefficient, else the usual one of organic liquids. */
export async function findIndexFall(compoundId: string): Promise<IndexFall> {
  const row = await findPreferredLiterature(compoundId, 'temperature coefficient of refractive index');
  if (!row || row.value === null) {
    return {
      fallPerC: USUAL_INDEX_FALL_PER_C,
      uncertaintyPerC: null,
      source: 'usual for organic liquids (common practice)',
    };
  }
  return {
    fallPerC: Math.abs(row.value),
    uncertaintyPerC: row.uncertainty ?? PUBLISHED_FALL_UNCERTAINTY,
    source: row.source,
  };
}
