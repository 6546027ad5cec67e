import { z } from 'zod';
import type { CriterionResult, JudgeInputs } from '../judge-inputs';
import { boilingRange } from './boiling-range';
import { gcMainPeak } from './gc-main-peak';
import { gcSingleImpurity } from './gc-single-impurity';
import type { CriterionKind } from './kind';
import { refractiveIndex } from './refractive-index';
import { tlcClean } from './tlc-clean';
import { water } from './water';

/** Every kind of criterion, by its name in a specification. A new one is a file and a line here. */
export const criterionKinds = {
  gcAreaPercentMin: gcMainPeak,
  gcSingleImpurityMaxPercent: gcSingleImpurity,
  refractiveIndexTolerance: refractiveIndex,
  boilingRange,
  tlcCleanUnder: tlcClean,
  waterMaxPercent: water,
} as const;

export type CriterionKey = keyof typeof criterionKinds;

/** The limits of a specification: at least one, no unknown ones. */
export const criteriaSchema = z
  .strictObject({
    gcAreaPercentMin: gcMainPeak.schema.optional(),
    gcSingleImpurityMaxPercent: gcSingleImpurity.schema.optional(),
    refractiveIndexTolerance: refractiveIndex.schema.optional(),
    boilingRange: boilingRange.schema.optional(),
    tlcCleanUnder: tlcClean.schema.optional(),
    waterMaxPercent: water.schema.optional(),
  } satisfies Record<CriterionKey, z.ZodType>)
  .refine((criteria) => Object.values(criteria).some((limit) => limit !== undefined), {
    message: 'Give at least one limit: a specification without limits judges nothing.',
  });

export type Criteria = z.output<typeof criteriaSchema>;

/** Every criterion of the specification, in the order of the registry. */
export function evaluateCriteria(inputs: JudgeInputs): CriterionResult[] {
  const { specification } = inputs;
  if (!specification) return [];
  return Object.entries(criterionKinds).flatMap(([key, kind]) => {
    const limit = specification.criteria[key as CriterionKey];
    if (limit === undefined) return [];
    return (kind as CriterionKind).evaluate(inputs, limit, specification.decisionRule);
  });
}
