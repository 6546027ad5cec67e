import { randomBytes } from 'node:crypto';

// Crockford's base 32: no I, L, O, U, so that a code can be read from paper and typed.
const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const length = 12;

/** A public code of 60 random bits, in three groups of four: `7K2M-9QXT-04HB`. */
export function newSignatureCode(): string {
  const letters = [...randomBytes(length)].map((byte) => alphabet[byte % 32]).join('');
  return group(letters);
}

function group(letters: string): string {
  return (letters.match(/.{4}/g) ?? []).join('-');
}

/** A code as somebody typed it, in its one form; null for what cannot be a code. */
export function readSignatureCode(typed: string): string | null {
  const letters = typed
    .toUpperCase()
    .replace(/[\s-]+/g, '')
    .replace(/O/g, '0')
    .replace(/[IL]/g, '1');
  return letters.length === length && [...letters].every((letter) => alphabet.includes(letter))
    ? group(letters)
    : null;
}
