import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

export const firstHash = '0'.repeat(64);

/** Everything of an event that its hash covers; `at` is ISO 8601 with milliseconds, UTC. */
export type ChainedEvent = {
  sequence: number;
  id: string;
  at: string;
  type: string;
  recordType: string;
  recordId: string;
  groupId: string | null;
  actorKind: 'user' | 'token' | 'system';
  actorId: string | null;
  actorName: string;
  reason: string | null;
  before: unknown;
  after: unknown;
  origin: unknown;
  previousHash: string;
};

/**
 * SHA-256, in hex, of the event as canonical JSON (RFC 8785). The previous event's hash is part of
 * it, so that no event can be changed, dropped or slipped in without breaking all that follow.
 */
export function hashEvent(event: ChainedEvent): string {
  return createHash('sha256')
    .update(canonicalize(event) as string, 'utf8')
    .digest('hex');
}
