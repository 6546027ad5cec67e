import { randomBytes } from 'node:crypto';
import type { z } from 'zod';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { requirePerson } from '@/lib/auth/require-person';
import { newId } from '@/lib/database/ids';
import { AccessToken, Instrument } from '@/lib/database/records';
import { invalidField, notFound } from '@/lib/errors';
import { hashToken } from './find-token-actor';
import type { createTokenBody } from './schema';

/**
 * Makes a token for an instrument PC: 256 random bits, returned once. Only its SHA-256 is kept, which
 * is enough for a secret that nobody can guess.
 */
export async function createToken(
  actor: Actor,
  input: z.output<typeof createTokenBody>,
): Promise<{ token: string; row: AccessToken & { instrument: Instrument } }> {
  authorise(actor, 'administration.write', null);
  const token = `hc_${randomBytes(32).toString('base64url')}`;
  return recorded(actor, async ({ transaction, record }) => {
    const instrument = await Instrument.findByPk(input.instrument, { transaction });
    if (!instrument)
      throw invalidField('instrument', 'There is no such instrument. Choose one from the list.');
    const expiresAt = new Date(Date.now() + input.expiresInDays * 86_400_000);
    const row = await AccessToken.create(
      {
        id: newId(),
        instrumentId: instrument.id,
        name: input.name,
        tokenHash: hashToken(token),
        hint: token.slice(-4),
        scopes: [...new Set(input.scopes)],
        expiresAt,
        madeById: requirePerson(actor).userId,
      },
      { transaction },
    );
    record({
      type: 'token.created',
      recordType: 'token',
      recordId: row.id,
      groupId: instrument.groupId,
      after: { instrument: instrument.name, name: row.name, scopes: row.scopes, expiresAt },
    });
    return { token, row: Object.assign(row, { instrument }) };
  });
}

/** Revokes a token; from now on it is refused. Revoking twice is not an error. */
export async function revokeToken(actor: Actor, id: string): Promise<void> {
  authorise(actor, 'administration.write', null);
  await recorded(actor, async ({ transaction, record }) => {
    const token = await AccessToken.findByPk(id, { transaction, lock: true });
    if (!token) throw notFound('token');
    if (token.revokedAt) return;
    const revokedAt = new Date();
    await token.update({ revokedAt }, { transaction });
    record({
      type: 'token.revoked',
      recordType: 'token',
      recordId: token.id,
      after: { name: token.name, revokedAt },
    });
  });
}
