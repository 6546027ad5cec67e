/** The states of a fraction, and the one table of what may be done in which. */
export const fractionStatuses = ['open', 'submitted', 'returned', 'signed off', 'reopened'] as const;
export type FractionStatus = (typeof fractionStatuses)[number];

export const cuts = ['fore-run', 'heart', 'tail', 'residue', 'trap'] as const;
export type Cut = (typeof cuts)[number];

/**
 * `change` is any change of the fraction or of evidence under it. A change of a signed-off fraction is
 * allowed, but it supersedes the signature and makes the fraction `reopened`.
 */
export const allowedIn = {
  change: ['open', 'submitted', 'returned', 'signed off', 'reopened'],
  submit: ['open', 'returned', 'reopened'],
  return: ['submitted'],
  signOff: ['submitted'],
  reopen: ['signed off'],
  share: ['signed off'],
} as const satisfies Record<string, readonly FractionStatus[]>;

export type FractionAction = keyof typeof allowedIn;

const words: Record<FractionAction, string> = {
  change: 'changed',
  submit: 'submitted',
  return: 'returned',
  signOff: 'signed off',
  reopen: 'reopened',
  share: 'shared',
};

// "open, returned or reopened": British English writes no comma before the last.
const orList = new Intl.ListFormat('en-GB', { type: 'disjunction' });

/** Why an action is not possible in this state, in words for a person; null when it is. */
export function whyNotInState(action: FractionAction, status: FractionStatus): string | null {
  const states: readonly FractionStatus[] = allowedIn[action];
  if (states.includes(status)) return null;
  return `The fraction is ${status}; it can be ${words[action]} only when it is ${orList.format(states)}.`;
}
