import type { Recorder } from '@/lib/audit/recorded';
import type { Fraction } from '@/lib/database/records';
import { judgeFraction } from './judge-fraction';
import { supersedeSignatures } from '@/lib/signoff/supersede-signatures';

/**
 * To be called by every command after it wrote anything under a fraction (its row must be locked by
 * requireFractionForChange): supersedes signatures that no longer cover what is there, takes a returned
 * fraction back to work, and judges anew. `what` says in words what changed, for example
 * 'plate photo added'.
 */
export async function fractionChanged(recorder: Recorder, fraction: Fraction, what: string): Promise<void> {
  await supersedeSignatures(recorder, fraction, what);
  await judgeFraction(recorder, fraction);
}
