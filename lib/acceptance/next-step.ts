import type { FractionSheet } from './fraction-sheet-schema';

type Standing = Pick<FractionSheet, 'status' | 'verdict' | 'transitions'>;

/** What has to happen next with a fraction, and who has to do it, in a sentence. */
export function nextStepOf({ status, verdict, transitions }: Standing): string {
  if (status === 'signed off') return 'Nothing: it is released by a signature. A change would end that.';
  if (status === 'returned') {
    const reason = transitions.find((one) => one.action === 'return')?.reason;
    return `The chemist does what the analyst asked for${reason ? `: ${reason}` : ''}, then submits it again.`;
  }
  if (!verdict.specification)
    return 'A PI writes a specification for this compound; until then nothing can be judged.';
  if (status === 'submitted') {
    if (verdict.state === 'pass')
      return 'An analyst or PI who did not collect it signs it off, or returns it.';
    if (verdict.state === 'fail')
      return 'An analyst returns it with the reason: a failing fraction is not released.';
    return 'An analyst adds what is still open below, or returns it with a reason.';
  }
  const open = missingOf({ verdict });
  if (open.length > 0 && verdict.state !== 'fail')
    return `The chemist adds what is missing (${open.join(', ')}), or submits it as far as it goes.`;
  if (verdict.state === 'fail') {
    const failing = failingOf({ verdict });
    const outside = failing.length > 0 ? `outside its limit (${failing.join(', ')})` : 'outside its limits';
    return `It is ${outside}: the chemist measures again if in doubt, distils it again, or keeps it out of use.`;
  }
  return 'The chemist submits it for sign-off.';
}

/** The criteria that nothing on record answers yet. */
export function missingOf({ verdict }: Pick<Standing, 'verdict'>): string[] {
  return verdict.criteria.filter((one) => one.state === 'missing').map((one) => one.name);
}

function failingOf({ verdict }: Pick<Standing, 'verdict'>): string[] {
  return verdict.criteria.filter((one) => one.state === 'fail').map((one) => one.name);
}
