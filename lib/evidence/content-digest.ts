import { Problem } from '@/lib/errors';

export type GivenDigest = { algorithm: 'sha256' | 'sha512'; base64: string };

const names = { 'sha-256': 'sha256', 'sha-512': 'sha512' } as const;

/**
 * The digest of a `Content-Digest` header (RFC 9530): a dictionary such as `sha-256=:…:`. SHA-256 is preferred; null
 * without the header. 400 when it holds neither SHA-256 nor SHA-512, since a sender who asks for a check must not
 * believe that one was made.
 */
export function readContentDigest(header: string | null): GivenDigest | null {
  if (header === null) return null;
  const found = new Map<string, string>();
  for (const part of header.split(',')) {
    const match = /^\s*([a-z0-9-]+)=:([A-Za-z0-9+/]*={0,2}):\s*$/.exec(part);
    if (match) found.set(match[1]!, match[2]!);
  }
  for (const [name, algorithm] of Object.entries(names) as [keyof typeof names, 'sha256' | 'sha512'][]) {
    const base64 = found.get(name);
    if (base64 !== undefined) return { algorithm, base64 };
  }
  throw new Problem('malformed', 'Send the digest as Content-Digest: sha-256=:<base64>: (RFC 9530).');
}

/** 400 when the bytes that came are not those that were sent. */
export function requireSameDigest(given: GivenDigest | null, actual: Buffer): void {
  if (!given || Buffer.from(given.base64, 'base64').equals(actual)) return;
  throw new Problem(
    'digest-mismatch',
    'The bytes that arrived do not match the Content-Digest. Nothing was kept; send the file again.',
  );
}
