import { type Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Share, User } from '@/lib/database/records';
import { requireFraction } from '@/lib/distillation/require-fraction';
import type { ShareJson } from './share-schema';

export function presentShare(share: Share, madeBy: string): ShareJson {
  return {
    id: share.id,
    recipient: share.recipient ?? null,
    madeBy,
    createdAt: share.createdAt.toISOString(),
    expiresAt: share.expiresAt.toISOString(),
    revokedAt: share.revokedAt?.toISOString() ?? null,
    version: share.version,
  };
}

/** The links of a fraction, revoked and expired ones included, the newest first. They are few. */
export async function listShares(actor: Actor, code: string): Promise<ShareJson[]> {
  const fraction = await requireFraction(actor, code);
  authorise(actor, 'share.write', fraction.groupId);
  const shares = await Share.findAll({
    where: { fractionId: fraction.id },
    order: [['id', 'DESC']],
    limit: 200,
  });
  const users = await User.findAll({ where: { id: shares.map((share) => share.madeById) } });
  return shares.map((share) =>
    presentShare(share, users.find((user) => user.id === share.madeById)?.name ?? 'somebody'),
  );
}
