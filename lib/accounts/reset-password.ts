import { createHash, randomBytes } from 'node:crypto';
import { Op } from 'sequelize';
import { recorded } from '@/lib/audit/recorded';
import { type Origin, systemActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import { inTransaction } from '@/lib/database/transaction';
import { PasswordReset, User } from '@/lib/database/records';
import { env } from '@/lib/env';
import { Problem } from '@/lib/errors';
import { queueMessage } from '@/lib/mail/queue-message';
import { setPassword } from './change-password';
import { noteFailure, secondsLocked } from './throttle';

const validMinutes = 60;

function hash(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/**
 * Mails a reset link if the account exists and is not disabled. Says nothing to the caller either way;
 * an address may ask a few times in a row, then must wait like after wrong passwords.
 */
export async function askPasswordReset(email: string): Promise<void> {
  const address = email.trim().toLowerCase();
  const subject = `reset:${address}`;
  if ((await secondsLocked(subject)) > 0) return;
  await noteFailure(subject);
  const user = await User.findOne({ where: { email: address, disabledAt: null } });
  if (!user) return;
  const token = randomBytes(32).toString('base64url');
  await inTransaction(async (transaction) => {
    await PasswordReset.create(
      {
        id: newId(),
        userId: user.id,
        tokenHash: hash(token),
        expiresAt: new Date(Date.now() + validMinutes * 60_000),
      },
      { transaction },
    );
    await queueMessage(
      { transaction },
      {
        kind: 'password reset',
        recipient: user.email,
        subject: 'Heartcut: set a new password',
        body: `Somebody, probably you, asked for a new password for ${user.email}.\n\nOpen this page within ${validMinutes} minutes:\n${env().publicUrl}/new-password/${token}\n\nIf it was not you, do nothing: the present password stays.\n`,
      },
    );
  });
}

/** Sets a new password by a mailed token, once. 422 for a token that is unknown, used or too old. */
export async function resetPassword(token: string, newPassword: string, origin: Origin): Promise<void> {
  await recorded({ ...systemActor('Password reset'), origin }, async (recorder) => {
    const { transaction, record } = recorder;
    const reset = await PasswordReset.findOne({
      where: { tokenHash: hash(token), usedAt: null, expiresAt: { [Op.gt]: new Date() } },
      transaction,
      lock: true,
    });
    const user = reset && (await User.findByPk(reset.userId, { transaction, lock: true }));
    if (!reset || !user || user.disabledAt) {
      throw new Problem(
        'invalid',
        'This link was used already or is too old. Ask for a new one on the sign-in page.',
      );
    }
    await reset.update({ usedAt: new Date() }, { transaction });
    await setPassword(recorder, user, newPassword);
    record({ type: 'user.password_reset', recordType: 'user', recordId: user.id });
  });
}
