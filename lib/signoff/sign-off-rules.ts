import { type Actor } from '@/lib/auth/actor';
import { whyNot } from '@/lib/auth/authorise';
import type { Action } from '@/lib/auth/role-table';
import { type FractionAction, type FractionStatus, whyNotInState } from '@/lib/distillation/fraction-states';
import type { VerdictState } from '@/lib/acceptance/judge-inputs';

/** What of a fraction decides on what may be done with it. */
export type FractionStanding = {
  groupId: string;
  status: FractionStatus;
  collectedById: string;
  verdictState: VerdictState;
};

export const fractionActions = ['change', 'submit', 'return', 'signOff', 'reopen', 'share'] as const;
export type FractionActions = Record<(typeof fractionActions)[number], string | null>;

const roleAction: Record<FractionAction, Action> = {
  change: 'fraction.write',
  submit: 'fraction.submit',
  return: 'fraction.return',
  signOff: 'fraction.signOff',
  reopen: 'fraction.reopen',
  share: 'share.write',
};

const whatToDo: Record<Exclude<VerdictState, 'pass'>, string> = {
  fail: 'The verdict is fail: what is outside its limit cannot be released. Return the fraction with the reason.',
  blind:
    'The verdict is blind: no test that was done sees a known impurity. Add the test that the coverage table names, or return the fraction.',
  inconclusive:
    'The verdict is inconclusive: a limit lies inside the uncertainty. Repeat the measurement that the criteria name, or return the fraction.',
  incomplete:
    'The verdict is incomplete: evidence that the specification asks for is missing. Add it, or return the fraction.',
};

/** Why nobody may sign this verdict for release, with what to do; null for pass. */
export function whyNotReleasable(state: VerdictState): string | null {
  return state === 'pass' ? null : whatToDo[state];
}

/** Why this person may never sign this fraction: two pairs of eyes. */
export function whyNotTheSigner(actor: Actor, fraction: FractionStanding): string | null {
  return actor.kind === 'user' && actor.userId === fraction.collectedById
    ? 'You collected this fraction: somebody else has to sign it off.'
    : null;
}

/** Every action with the reason why it is not possible now, or null: what buttons show and commands enforce. */
export function presentFractionActions(actor: Actor, fraction: FractionStanding): FractionActions {
  const reasonFor = (action: FractionAction): string | null =>
    whyNot(actor, roleAction[action], fraction.groupId) ?? whyNotInState(action, fraction.status);
  return {
    change: reasonFor('change'),
    submit: reasonFor('submit'),
    return: reasonFor('return'),
    signOff:
      whyNot(actor, roleAction.signOff, fraction.groupId) ??
      whyNotTheSigner(actor, fraction) ??
      whyNotInState('signOff', fraction.status) ??
      whyNotReleasable(fraction.verdictState),
    reopen: reasonFor('reopen'),
    share: reasonFor('share'),
  };
}
