import { verifyPassword } from '@/lib/accounts/password';
import { clearFailures, noteFailure, secondsLocked } from '@/lib/accounts/throttle';
import type { UserActor } from '@/lib/auth/actor';
import { User } from '@/lib/database/records';
import { Problem } from '@/lib/errors';

/**
 * Asks for the password again, before a signature. Wrong ones are counted apart from sign-in, so that failed
 * sign-ins by a stranger never stop a signature: 403 for a wrong one, 429 with Retry-After while it must wait.
 */
export async function confirmPassword(actor: UserActor, password: string): Promise<void> {
  const account = `signature:${actor.userId}`;
  const waitSeconds = await secondsLocked(account);
  if (waitSeconds > 0) {
    throw new Problem('too-many', `Too many wrong passwords. Try again in ${waitSeconds} s.`, {
      retryAfterSeconds: waitSeconds,
    });
  }
  const user = await User.findByPk(actor.userId);
  if (!(await verifyPassword(password, user?.passwordHash ?? null)) || user?.disabledAt) {
    await noteFailure(account);
    throw new Problem('not-allowed', 'The password is not right. Nothing was signed; type it again.', {
      errors: [{ path: 'password', message: 'The password is not right.' }],
    });
  }
  await clearFailures(account);
}
