import { findSpecificationOf, specificationInput } from '@/lib/acceptance/find-specification';
import type { Fraction } from '@/lib/database/records';
import type { Tolerance } from './compare-readings';

/** What is looked for where no specification says otherwise (common practice). */
const USUAL: Tolerance = {
  tolerance: 0.0005,
  rule: 'simple',
  source: 'no specification gives a tolerance: 0.0005, simple acceptance (common practice)',
};

/** Tolerance and decision rule of the specification that the fraction is judged by, else the usual ones. */
export async function findTolerance(fraction: Fraction): Promise<Tolerance> {
  const row = await findSpecificationOf(fraction);
  if (!row) return USUAL;
  const specification = specificationInput(row);
  const tolerance = specification.criteria.refractiveIndexTolerance;
  if (tolerance === undefined) return USUAL;
  return {
    tolerance,
    rule: specification.decisionRule,
    source: `specification ${specification.grade}, edition ${specification.edition}`,
  };
}
