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
  const place = `address:${address ?? 'unknown'}`;
  const subjects = [
    { name: `${account} ${place}`, free: freeTries.accountAtAddress },
    { name: place, free: freeTries.address },
    { name: account, free: freeTries.account },
  ];
  const waits = await Promise.all(subjects.map(({ name }) => secondsLocked(name)));
  const user = await User.findOne({ where: { email: email.trim().toLowerCase() } });
  const right = await verifyPassword(password.slice(0, 1000), user?.passwordHash ?? null);
  if (waits.some((seconds) => seconds > 0)) return null;
  if (!user || !right || user.disabledAt) {
    for (const { name, free } of subjects) await noteFailure(name, free);
    return null;
  }
  await clearFailures(`${account} ${place}`);
  await clearFailures(account);
  return { id: user.id, sessionVersion: user.sessionVersion };
}
