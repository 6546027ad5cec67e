import type { Criteria } from '@/lib/acceptance/criteria/registry';
import { findVisualiser } from '@/lib/evidence/tlc/visualisers';

/** The limits of a specification, one sentence each. */
export function limitsText(criteria: Criteria): string[] {
  const { boilingRange: boiling, tlcCleanUnder: tlc } = criteria;
  const lines: (string | null)[] = [
    criteria.gcAreaPercentMin === undefined
      ? null
      : `GC: target at least ${criteria.gcAreaPercentMin} area %`,
    criteria.gcSingleImpurityMaxPercent === undefined
      ? null
      : `GC: any one impurity at most ${criteria.gcSingleImpurityMaxPercent} area %`,
    criteria.refractiveIndexTolerance === undefined
      ? null
      : `refractive index within ${criteria.refractiveIndexTolerance} of the literature`,
    boiling
      ? `boiling range within ${boiling.toleranceC} °C of the expected${boiling.maximumWidthC === undefined ? '' : `, at most ${boiling.maximumWidthC} °C wide`}`
      : null,
    tlc ? `TLC: one spot under ${tlc.map((id) => findVisualiser(id)?.name ?? id).join(', ')}` : null,
    criteria.waterMaxPercent === undefined ? null : `water at most ${criteria.waterMaxPercent} area %`,
  ];
  return lines.filter((line) => line !== null);
}
