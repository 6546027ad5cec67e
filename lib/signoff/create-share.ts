import { randomBytes } from 'node:crypto';
import { digestOfText } from '@/lib/acceptance/digest';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { newId } from '@/lib/database/ids';
import { Share } from '@/lib/database/records';
import { env } from '@/lib/env';
import type { ShareJson } from './share-schema';
import { presentShare } from './shares';
import { lockForStep } from './take-step';

const dayMs = 86_400_000;

/** Makes an expiring, read-only link to a signed-off fraction. The token is answered once; its SHA-256 is kept. */
export async function createShare(
  actor: Actor,
  code: string,
  input: { recipient?: string | undefined; expiresInDays: number },
): Promise<ShareJson & { token: string; url: string }> {
  const person = requirePerson(actor);
  const token = randomBytes(32).toString('base64url');
  const share = await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const fraction = await lockForStep(recorder, code, {
      action: 'share',
      right: 'share.write',
      version: null,
    });
    const made = await Share.create(
      {
        id: newId(),
        fractionId: fraction.id,
        tokenHash: digestOfText(token),
        recipient: input.recipient || null,
        expiresAt: new Date(Date.now() + input.expiresInDays * dayMs),
        madeById: person.userId,
      },
      { transaction },
    );
    record({
      type: 'share.created',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: fraction.groupId,
      after: { shareId: made.id, recipient: made.recipient, expiresAt: made.expiresAt.toISOString() },
    });
    return made;
  });
  return { ...presentShare(share, person.name), token, url: `${env().publicUrl}/share/${token}` };
}
