import { type Fraction, FractionTransition } from '@/lib/database/records';
import { reopenFraction } from '@/lib/signoff/reopen-fraction';
import { returnFraction } from '@/lib/signoff/return-fraction';
import { signOffFraction } from '@/lib/signoff/sign-off-fraction';
import { submitFraction } from '@/lib/signoff/submit-fraction';
import type { LaidOutRun } from './lay-out-run';
import type { Signatory, Team } from './people';
import { readIndex } from './read-index';
import type { CutPlan, RunPlan } from './run-plan';

async function hasTaken(fraction: Fraction, action: string): Promise<boolean> {
  return (await FractionTransition.count({ where: { fractionId: fraction.id, action } as never })) > 0;
}

async function submit(team: Team, fraction: Fraction): Promise<void> {
  if (await hasTaken(fraction, 'submit')) return;
  await submitFraction(team.chemist.actor, fraction.code, { version: null });
}

async function signOff(signer: Signatory, fraction: Fraction, forPooling: boolean): Promise<void> {
  if (await hasTaken(fraction, 'sign off')) return;
  await signOffFraction(signer.actor, fraction.code, {
    password: signer.password,
    meaning: forPooling ? 'reviewed and released for pooling' : 'reviewed and released for use',
    comment: 'Demo signature, invented.',
    version: null,
  });
}

async function finish(team: Team, laidOut: LaidOutRun, fraction: Fraction, cut: CutPlan): Promise<void> {
  const { standing = 'open', reason = 'Please complete the record.' } = cut;
  if (standing === 'open') return;
  await submit(team, fraction);
  if (standing === 'submitted') return;
  if (standing === 'returned') {
    if (!(await hasTaken(fraction, 'return')))
      await returnFraction(team.analyst.actor, fraction.code, { reason, version: null });
    return;
  }
  await signOff(fraction.number % 2 === 0 ? team.analyst : team.pi, fraction, isPooled(laidOut.plan));
  if (standing === 'superseded') await readIndex(team, laidOut, fraction, 'second');
  if (standing === 'reopened' && !(await hasTaken(fraction, 'reopen')))
    await reopenFraction(team.pi.actor, fraction.code, { reason, version: null });
}

const isPooled = ({ note }: RunPlan) => note.includes('pooled');

/** Takes each fraction of a run to the standing that it has in the scenario, by the people whose step it is. */
export async function finishFractions(team: Team, laidOut: LaidOutRun): Promise<void> {
  for (const [at, cut] of laidOut.plan.cuts.entries())
    await finish(team, laidOut, laidOut.fractions[at]!, cut);
}
