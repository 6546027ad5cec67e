import { newId } from '@/lib/database/ids';
import type { Recorder } from '@/lib/audit/recorded';
import { OutboxMessage } from '@/lib/database/records';

export type MessageDraft = { kind: string; recipient: string; subject: string; body: string };

/**
 * Puts an e-mail into the outbox in the transaction that caused it: it is sent if, and only if, the
 * change was saved.
 */
export async function queueMessage(
  { transaction }: Pick<Recorder, 'transaction'>,
  draft: MessageDraft,
): Promise<void> {
  await OutboxMessage.create({ id: newId(), ...draft, nextAttemptAt: new Date() }, { transaction });
}
