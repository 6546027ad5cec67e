import type { Recorder } from '@/lib/audit/recorded';
import { recorded } from '@/lib/audit/recorded';
import type { UserActor } from '@/lib/auth/actor';
import { PasswordReset, User } from '@/lib/database/records';
import { invalidField, notFound, Problem } from '@/lib/errors';
import { hashPassword, verifyPassword } from './password';
import { clearFailures, noteFailure, secondsLocked } from './throttle';

/** Throws 429 while the account is locked after failures; 422 for `field` when the password is not the account's. */
export async function requirePassword(actor: UserActor, password: string, field: string): Promise<void> {
  const subject = `password change:${actor.userId}`;
  const seconds = await secondsLocked(subject);
  if (seconds > 0) {
    throw new Problem('too-many', `Too many wrong passwords. Wait ${seconds} s, then try again.`, {
      retryAfterSeconds: seconds,
    });
  }
  const user = await User.findByPk(actor.userId);
  if (await verifyPassword(password, user?.passwordHash ?? null)) {
    await clearFailures(subject);
    return;
  }
  await noteFailure(subject);
  throw invalidField(field, 'This is not your present password. Type it again.');
}

/** Sets a password, ends every session of the account and every reset link that is still out. In a recorded transaction. */
export async function setPassword({ transaction }: Recorder, user: User, password: string): Promise<void> {
  await user.update(
    {
      passwordHash: await hashPassword(password),
      mustChangePassword: false,
      sessionVersion: user.sessionVersion + 1,
    },
    { transaction },
  );
  await PasswordReset.update(
    { usedAt: new Date() },
    { where: { userId: user.id, usedAt: null }, transaction },
  );
}

/** Changes the caller's own password. All sign-ins end; the person signs in again with the new one. */
export async function changePassword(
  actor: UserActor,
  currentPassword: string,
  newPassword: string,
): Promise<void> {
  await requirePassword(actor, currentPassword, 'currentPassword');
  if (currentPassword === newPassword)
    throw invalidField('newPassword', 'Take a password that differs from the present one.');
  await recorded(actor, async (recorder) => {
    const user = await User.findByPk(actor.userId, { transaction: recorder.transaction, lock: true });
    if (!user) throw notFound('account');
    await setPassword(recorder, user, newPassword);
    recorder.record({ type: 'user.password_changed', recordType: 'user', recordId: user.id });
  });
}

/** Ends every sign-in of the caller's account, on all machines, this one too. */
export async function signOutEverywhere(actor: UserActor): Promise<void> {
  await recorded(actor, async ({ transaction, record }) => {
    const user = await User.findByPk(actor.userId, { transaction, lock: true });
    if (!user) throw notFound('account');
    await user.update({ sessionVersion: user.sessionVersion + 1 }, { transaction });
    record({ type: 'user.signed_out_everywhere', recordType: 'user', recordId: user.id });
  });
}
