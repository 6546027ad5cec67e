import { digestOfText } from '@/lib/acceptance/digest';
import { Compound, Fraction, Run, Share, User } from '@/lib/database/records';
import type { FractionWithRun } from '@/lib/distillation/require-fraction';

export type OpenShare = { fractionId: string; fraction: FractionWithRun; expiresAt: Date };

/**
 * What a read-only link leads to. Null for an unknown, expired or revoked token alike, and when the fraction is no
 * longer signed off: what was to be shared is then no longer what is there.
 */
export async function findOpenShare(token: string): Promise<OpenShare | null> {
  const share = await Share.findOne({ where: { tokenHash: digestOfText(token) } });
  if (!share || share.revokedAt || share.expiresAt.getTime() <= Date.now()) return null;
  const fraction = (await Fraction.findByPk(share.fractionId, {
    include: [
      { model: Run, as: 'run' },
      { model: Compound, as: 'compound' },
      { model: User, as: 'collectedBy' },
    ],
  })) as FractionWithRun | null;
  if (!fraction || fraction.status !== 'signed off') return null;
  return { fractionId: fraction.id, fraction, expiresAt: share.expiresAt };
}
