import { invalidField } from '@/lib/errors';
import { correctIndex, INDEX_METHOD_VERSION } from '@/lib/evidence/refractive-index/correct-index';
import { findIndexFall, findLiteratureIndex } from '@/lib/evidence/refractive-index/find-index';
import { indexBudget } from '@/lib/evidence/refractive-index/uncertainty';
import { presentCompoundRef } from '../present';
import { findPlannerCompound } from './find-liquid';
import type { RefractiveIndexBody } from './schema';

/** One reading carried to the temperature of the literature value; nothing is saved. 422 without such a value. */
export async function computeRefractiveIndex({ compound: reference, n, temperatureC }: RefractiveIndexBody) {
  const compound = await findPlannerCompound(reference, 'compound');
  const literature = await findLiteratureIndex(compound.id);
  if (!literature) {
    throw invalidField(
      'compound',
      `No refractive index of ${compound.name} at the sodium D line is kept. A PI can add one with its source to the compound.`,
    );
  }
  const fall = await findIndexFall(compound.id);
  const correctedN = correctIndex({
    n,
    temperatureC,
    toTemperatureC: literature.temperatureC,
    fallPerC: fall.fallPerC,
  });
  const budget = indexBudget({
    readings: [n],
    temperatureC,
    literatureTemperatureC: literature.temperatureC,
    fallPerC: fall.fallPerC,
    ...(fall.uncertaintyPerC === null ? {} : { fallUncertaintyPerC: fall.uncertaintyPerC }),
    ...(literature.halfWidth === null ? {} : { literatureHalfWidth: literature.halfWidth }),
  });
  return {
    correctedN,
    atTemperatureC: literature.temperatureC,
    difference: correctedN - literature.n,
    expandedUncertainty: budget.expandedUncertainty,
    compound: presentCompoundRef(compound),
    literature: { n: literature.n, temperatureC: literature.temperatureC, source: literature.source },
    fallPerC: fall.fallPerC,
    fallSource: fall.source,
    method: INDEX_METHOD_VERSION,
    notes: budget.notes,
  };
}
