import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Share } from '@/lib/database/records';
import { requireFractionForChange } from '@/lib/distillation/require-fraction';
import { notFound } from '@/lib/errors';

/** Ends a link at once, in any state of the fraction. A link that was revoked before stays as it was. */
export async function revokeShare(actor: Actor, code: string, shareId: string): Promise<void> {
  await recorded(actor, async ({ transaction, record }) => {
    const fraction = await requireFractionForChange(actor, code, transaction);
    authorise(actor, 'share.write', fraction.groupId);
    const share = await Share.findOne({ where: { id: shareId, fractionId: fraction.id }, transaction });
    if (!share) throw notFound('link of this fraction');
    if (share.revokedAt) return;
    await share.update({ revokedAt: new Date() }, { transaction });
    record({
      type: 'share.revoked',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: fraction.groupId,
      after: { shareId: share.id },
    });
  });
}
