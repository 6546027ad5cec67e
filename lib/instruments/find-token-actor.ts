import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import type { Origin, Scope, TokenActor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { AccessToken, Instrument } from '@/lib/database/records';

export function hashToken(token: string): string {
  return createHash('sha256').update(token, 'utf8').digest('hex');
}

/** The instrument behind a bearer token; null when unknown, expired or revoked. Notes when it was last seen. */
export async function findTokenActor(token: string, origin: Origin): Promise<TokenActor | null> {
  const row = (await AccessToken.findOne({
    where: { tokenHash: hashToken(token) },
    include: [{ model: Instrument, as: 'instrument' }],
  })) as (AccessToken & { instrument: Instrument }) | null;
  if (!row || row.revokedAt || row.expiresAt.getTime() <= Date.now()) return null;
  // Not a change of the record: a heartbeat, at most once a minute, outside the audit trail.
  if (!row.lastSeenAt || Date.now() - row.lastSeenAt.getTime() > 60_000) {
    await database().query('UPDATE access_tokens SET lastSeenAt = UTC_TIMESTAMP(3) WHERE id = ?', {
      replacements: [row.id],
      type: QueryTypes.UPDATE,
    });
  }
  return {
    kind: 'token',
    tokenId: row.id,
    name: `${row.instrument.name} (${row.name})`,
    instrumentId: row.instrument.id,
    groupId: row.instrument.groupId,
    scopes: row.scopes as Scope[],
    origin,
  };
}
