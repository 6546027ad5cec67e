import type { CriterionResult } from '../judge-inputs';

export type JudgedReading = {
  result: CriterionResult;
  /** Cannot be compared at all: wrong light, an instrument that is off, no literature value. */
  hindered: boolean;
  expandedUncertainty: number | null;
};

const order = ['fail', 'blind', 'missing', 'inconclusive', 'pass'] as const;

/** A reading undecided by its uncertainty asks for a better one: one at most half as uncertain answers it. */
const BETTER = 0.5;

function answered(reading: JudgedReading, later: JudgedReading[]): boolean {
  const valid = later.filter((one) => !one.hindered);
  if (reading.hindered) return valid.length > 0;
  if (reading.result.state !== 'inconclusive') return false;
  return valid.some(
    (one) => (one.expandedUncertainty ?? Infinity) <= BETTER * (reading.expandedUncertainty ?? 0),
  );
}

/**
 * Of all readings of a fraction, the newest first, the one that decides: the worst, so that nobody reads until it
 * passes. A reading that could not be compared gives way to a later one that can; a valid one that fails never does.
 *
 * @throws Error for an empty list
 */
export function decidingReading(newestFirst: JudgedReading[]): CriterionResult {
  const counting = newestFirst.filter((reading, at) => !answered(reading, newestFirst.slice(0, at)));
  const [worst] = [...counting].sort((a, b) => order.indexOf(a.result.state) - order.indexOf(b.result.state));
  if (!worst) throw new Error('decidingReading needs at least one reading');
  const count = newestFirst.length;
  if (count === 1) return worst.result;
  const number = count - newestFirst.indexOf(worst);
  const which = number === count ? `number ${number}, the latest` : `number ${number} in order of time`;
  const said = `Of ${count} readings of this fraction the one that decides worst counts: ${which}.`;
  return { ...worst.result, reason: `${worst.result.reason} ${said}` };
}
