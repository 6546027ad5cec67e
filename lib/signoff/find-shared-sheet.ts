import { digestOfText } from '@/lib/acceptance/digest';
import { buildFractionSheet } from '@/lib/acceptance/fraction-sheet';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';
import { Compound, Fraction, Run, Share, User } from '@/lib/database/records';
import type { FractionWithRun } from '@/lib/distillation/require-fraction';

export type SharedSheet =
  { state: 'open'; sheet: Omit<FractionSheet, 'actions'>; expiresAt: Date } | { state: 'ended' };

/**
 * The sheet behind a read-only link, as it is now. Ended for an unknown, expired or revoked token alike, and
 * when the fraction is no longer signed off: what was to be shared is then no longer what is there.
 */
export async function findSharedSheet(token: string): Promise<SharedSheet> {
  const share = await Share.findOne({ where: { tokenHash: digestOfText(token) } });
  if (!share || share.revokedAt || share.expiresAt.getTime() <= Date.now()) return { state: 'ended' };
  const fraction = (await Fraction.findByPk(share.fractionId, {
    include: [
      { model: Run, as: 'run' },
      { model: Compound, as: 'compound' },
      { model: User, as: 'collectedBy' },
    ],
  })) as FractionWithRun | null;
  if (!fraction || fraction.status !== 'signed off') return { state: 'ended' };
  return { state: 'open', sheet: await buildFractionSheet(fraction), expiresAt: share.expiresAt };
}
