import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

/** A value as canonical JSON (RFC 8785); through JSON once, so that what is absent stays absent. */
export function canonicalJson(value: unknown): string {
  return canonicalize(JSON.parse(JSON.stringify(value))) as string;
}

/** SHA-256, in hex, of the canonical JSON of a value. */
export function digestOf(value: unknown): string {
  return createHash('sha256').update(canonicalJson(value), 'utf8').digest('hex');
}

/** SHA-256, in hex, of a text that is kept as it is. */
export function digestOfText(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}
