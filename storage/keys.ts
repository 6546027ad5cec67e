const SHA256_HEX = /^[0-9a-f]{64}$/;
const KEY = /^sha256\/([0-9a-f]{2})\/([0-9a-f]{2})\/([0-9a-f]{64})$/;

/**
 * The key of an object is its own digest, so a key is written at most once and the name says what must be inside.
 * `sha256Hex` is 64 lower-case hex digits; throws RangeError for anything else.
 */
export function objectKeyFor(sha256Hex: string): string {
  if (!SHA256_HEX.test(sha256Hex)) throw new RangeError('A SHA-256 digest has 64 lower-case hex digits.');
  return `sha256/${sha256Hex.slice(0, 2)}/${sha256Hex.slice(2, 4)}/${sha256Hex}`;
}

/** The digest that a key promises, in hex. Throws RangeError when the key is not one of ours. */
export function sha256FromKey(key: string): string {
  const match = KEY.exec(key);
  const digest = match?.[3];
  if (!digest || objectKeyFor(digest) !== key) throw new RangeError(`Not a key of stored evidence: ${key}`);
  return digest;
}
