import { buildFractionSheet } from '@/lib/acceptance/fraction-sheet';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';
import { findOpenShare } from './find-open-share';

export type SharedSheet =
  { state: 'open'; sheet: Omit<FractionSheet, 'actions'>; expiresAt: Date } | { state: 'ended' };

/** The sheet behind a read-only link, as it is now; ended where findOpenShare finds nothing. */
export async function findSharedSheet(token: string): Promise<SharedSheet> {
  const share = await findOpenShare(token);
  if (!share) return { state: 'ended' };
  return { state: 'open', sheet: await buildFractionSheet(share.fraction), expiresAt: share.expiresAt };
}
