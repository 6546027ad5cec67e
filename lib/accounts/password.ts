import { randomBytes, scrypt, timingSafeEqual } from 'node:crypto';

// OWASP Password Storage Cheat Sheet, scrypt: N = 2^15, r = 8, p = 3 (32 MiB for each try).
const cost = { N: 2 ** 15, r: 8, p: 3, maxmem: 64 * 1024 * 1024 };
const keyLength = 32;

function derive(password: string, salt: Buffer, options: typeof cost): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    // NFKC, so that the same keys typed on another keyboard layout's composer give the same bytes.
    scrypt(password.normalize('NFKC'), salt, keyLength, options, (error, key) =>
      error ? reject(error) : resolve(key),
    );
  });
}

/** A self-describing hash: `scrypt$N$r$p$salt$key`, base64url. */
export async function hashPassword(password: string): Promise<string> {
  const salt = randomBytes(16);
  const key = await derive(password, salt, cost);
  return ['scrypt', cost.N, cost.r, cost.p, salt.toString('base64url'), key.toString('base64url')].join('$');
}

// For accounts that do not exist: the same work is done, so that the answer takes the same time.
const nobody = `scrypt$${cost.N}$${cost.r}$${cost.p}$${Buffer.alloc(16).toString('base64url')}$${Buffer.alloc(32).toString('base64url')}`;

/** Compares in constant time. Give null for an unknown account: the work is done all the same. */
export async function verifyPassword(password: string, stored: string | null): Promise<boolean> {
  const [scheme, N, r, p, salt, key] = (stored ?? nobody).split('$');
  if (scheme !== 'scrypt' || !salt || !key) return false;
  const derived = await derive(password, Buffer.from(salt, 'base64url'), {
    ...cost,
    N: Number(N),
    r: Number(r),
    p: Number(p),
  });
  const same = timingSafeEqual(derived, Buffer.from(key, 'base64url'));
  return same && stored !== null;
}
