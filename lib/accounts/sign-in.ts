import { User } from '@/lib/database/records';
import { verifyPassword } from './password';
import { clearFailures, freeTries, noteFailure, secondsLocked } from './throttle';

export type SignedIn = { id: string; sessionVersion: number };

/**
 * Checks e-mail and password. The answer is the same, and takes the same work, whether the account is
 * unknown, disabled, locked or the password is wrong: null.
 */
export async function signIn(
  email: string,
  password: string,
  address: string | null,
): Promise<SignedIn | null> {
  const account = `account:${email.trim().toLowerCase().slice(0, 254)}`;
  const place = address ? `address:${address.slice(0, 80)}` : null;
  const locked = (await secondsLocked(account)) > 0 || (place !== null && (await secondsLocked(place)) > 0);
  const user = await User.findOne({ where: { email: email.trim().toLowerCase() } });
  const right = await verifyPassword(password.slice(0, 1000), user?.passwordHash ?? null);
  if (locked) return null;
  if (!user || !right || user.disabledAt) {
    await noteFailure(account);
    if (place) await noteFailure(place, freeTries.address);
    return null;
  }
  await clearFailures(account);
  return { id: user.id, sessionVersion: user.sessionVersion };
}
