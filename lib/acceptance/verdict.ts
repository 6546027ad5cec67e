import { cleanPercent } from './clean-percent';
import { buildCoverage } from './coverage';
import { evaluateCriteria } from './criteria/registry';
import type { CoverageRow, CriterionResult, JudgeInputs, VerdictState } from './judge-inputs';
import { integratedTraces } from './criteria/gc-main-peak';
import { targetPurity } from './target-purity';

/** Changes whenever the same records could give another verdict. */
export const ENGINE_VERSION = 'verdict-2';

export type Judgement = {
  state: VerdictState;
  /** Why the whole is what it is, in a sentence; with what to do next. */
  summary: string;
  criteria: CriterionResult[];
  coverage: CoverageRow[];
  /** The lowest area per cent of the target among the fraction's traces; null without one. */
  purityPercent: number | null;
  engineVersion: string;
};

/** The lowest purity that a trace of the fraction shows: a second injection never hides the first. */
function lowestPurity(inputs: JudgeInputs): number | null {
  const found = integratedTraces(inputs.traces).flatMap(
    (trace) => targetPurity(trace.peaks, inputs.target.id)?.areaPercent ?? [],
  );
  return found.length > 0 ? cleanPercent(Math.min(...found)) : null;
}

function list(names: string[]): string {
  return names.join(', ');
}

/**
 * The state of the whole, in this order: a criterion that fails outweighs everything; then what no test can
 * see, because more of the same evidence would not help; then what is missing; then what cannot be decided;
 * only then pass. Nobody is blind before the first test: a fraction without any is incomplete. Without a specification there is nothing to pass: incomplete.
 */
function overall(
  inputs: JudgeInputs,
  criteria: CriterionResult[],
  coverage: CoverageRow[],
): { state: VerdictState; summary: string } {
  if (!inputs.specification) {
    const summary = `There is no approved specification for ${inputs.target.name} in this group. A PI must write one on the compound's page.`;
    return { state: 'incomplete', summary };
  }
  const named = (state: CriterionResult['state']) =>
    criteria.filter((c) => c.state === state).map((c) => c.name);
  const failed = named('fail');
  if (failed.length > 0) return { state: 'fail', summary: `Outside its limit: ${list(failed)}.` };
  // Before the first test a fraction is not blind, it is only not looked at yet.
  const looked = coverage.some((row) => row.tests.some((cell) => cell.state !== 'not done'));
  const holes = looked ? coverage.filter((row) => row.decides && !row.seen) : [];
  if (holes.length > 0) {
    const advice = holes.map((row) => row.advice).join(' ');
    return {
      state: 'blind',
      summary: `No test that was done sees ${list(holes.map((row) => row.compound))}. ${advice}`,
    };
  }
  const blind = named('blind');
  if (blind.length > 0)
    return { state: 'blind', summary: `The test that was done cannot see what is asked: ${list(blind)}.` };
  const missing = named('missing');
  if (missing.length > 0) return { state: 'incomplete', summary: `Still missing: ${list(missing)}.` };
  const undecided = named('inconclusive');
  if (undecided.length > 0)
    return { state: 'inconclusive', summary: `Cannot be decided: ${list(undecided)}.` };
  return {
    state: 'pass',
    summary: 'Every limit is met and every known impurity is seen by a test.',
  };
}

/** Judges a fraction. Pure: the same inputs always give the same judgement. */
export function judge(inputs: JudgeInputs): Judgement {
  const criteria = evaluateCriteria(inputs);
  const coverage = buildCoverage(inputs);
  return {
    ...overall(inputs, criteria, coverage),
    criteria,
    coverage,
    purityPercent: lowestPurity(inputs),
    engineVersion: ENGINE_VERSION,
  };
}
