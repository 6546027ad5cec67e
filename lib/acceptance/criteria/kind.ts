import type { z } from 'zod';
import type { CriterionResult, JudgeInputs, SpecificationInput } from '../judge-inputs';

/** One kind of criterion: the part of the specification that it reads, and the rule. Pure. */
export type CriterionKind<S extends z.ZodType = z.ZodType> = {
  /** As people read it. */
  name: string;
  schema: S;
  /** One result a limit; several for a list of visualisers. */
  evaluate(
    inputs: JudgeInputs,
    limit: z.output<S>,
    rule: SpecificationInput['decisionRule'],
  ): CriterionResult[];
};

/** Keeps the type of the schema, so that `evaluate` is given what it reads. */
export function criterion<S extends z.ZodType>(kind: CriterionKind<S>): CriterionKind<S> {
  return kind;
}

type Facts = Omit<CriterionResult, 'state' | 'reason'>;

/** Decides on a number that must not be under (or over) a limit, as JCGM 106:2012, 8.2 and 8.3. */
export function decideLimit(input: {
  facts: Facts;
  measured: number;
  /** Half-width at k = 2; null where it is not known, and then a guarded decision cannot be made. */
  uncertainty: number | null;
  limit: number;
  side: 'at least' | 'at most';
  rule: SpecificationInput['decisionRule'];
  remedy: string;
}): CriterionResult {
  const { facts, measured, uncertainty, limit, side, rule, remedy } = input;
  const margin = side === 'at least' ? measured - limit : limit - measured;
  const rounding = 1e-9;
  if (rule === 'simple') {
    return margin >= -rounding
      ? { ...facts, state: 'pass', reason: 'Within the limit (simple acceptance).' }
      : { ...facts, state: 'fail', reason: 'Outside the limit (simple acceptance).' };
  }
  if (uncertainty === null)
    return {
      ...facts,
      state: 'inconclusive',
      reason: 'Its uncertainty is not known: the trace has no noise to judge by.',
    };
  if (margin - uncertainty >= -rounding)
    return { ...facts, state: 'pass', reason: 'Within the limit, with its uncertainty.' };
  if (margin + uncertainty < -rounding)
    return { ...facts, state: 'fail', reason: 'Outside the limit, even with its uncertainty.' };
  return { ...facts, state: 'inconclusive', reason: `The uncertainty reaches over the limit. ${remedy}` };
}
