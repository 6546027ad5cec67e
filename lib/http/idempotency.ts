import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { Problem } from '@/lib/errors';

/** How long a key is remembered. The contract promises 24 hours at least. */
export const keptHours = 48;
/** A call that crashed leaves its key claimed; after this time another may take it over. */
const abandonedAfterSeconds = 120;

export type Claim = { owner: string; key: string; digest: string };
export type KeptAnswer = { status: number; contentType: string; body: string };

/** What makes two requests the same: method, address, the version they change (`If-Match`) and body. */
export function digestOfRequest(method: string, url: URL, ifMatch: string | null, body: string): string {
  return createHash('sha256')
    .update(`${method} ${url.pathname}${url.search}\n${JSON.stringify(ifMatch)}\n${body}`)
    .digest('hex');
}

/**
 * Claims a key for one request. Returns the kept answer when the same request was answered before;
 * null when the caller is the first. 422 for the same key with another body, 409 while it still runs.
 */
export async function claimKey({ owner, key, digest }: Claim): Promise<KeptAnswer | null> {
  if (key.length > 200) throw new Problem('malformed', 'An Idempotency-Key has at most 200 characters.');
  const [, inserted] = await database().query(
    `INSERT IGNORE INTO idempotency_keys (owner, idempotencyKey, requestDigest, createdAt) VALUES (?, ?, ?, UTC_TIMESTAMP(3))`,
    { replacements: [owner, key, digest], type: QueryTypes.INSERT },
  );
  if (inserted === 1) return null;
  const [row] = await database().query<{
    requestDigest: string;
    status: number | null;
    response: string | null;
    ageSeconds: number;
  }>(
    `SELECT requestDigest, status, response, TIMESTAMPDIFF(SECOND, createdAt, UTC_TIMESTAMP(3)) AS ageSeconds
     FROM idempotency_keys WHERE owner = ? AND idempotencyKey = ?`,
    { replacements: [owner, key], type: QueryTypes.SELECT },
  );
  if (!row) return claimKey({ owner, key, digest });
  if (row.requestDigest !== digest) {
    throw new Problem(
      'invalid',
      'This Idempotency-Key was used for another request. Use a new key for each request.',
    );
  }
  if (row.status !== null && row.response !== null) return JSON.parse(row.response) as KeptAnswer;
  if (Number(row.ageSeconds) < abandonedAfterSeconds) {
    throw new Problem(
      'state-conflict',
      'The same request is still being worked on. Ask again in a few seconds.',
    );
  }
  await releaseKey({ owner, key });
  return claimKey({ owner, key, digest });
}

export async function keepAnswer({ owner, key }: Claim, answer: KeptAnswer): Promise<void> {
  await database().query(
    'UPDATE idempotency_keys SET status = ?, response = ? WHERE owner = ? AND idempotencyKey = ?',
    {
      replacements: [answer.status, JSON.stringify(answer), owner, key],
      type: QueryTypes.UPDATE,
    },
  );
}

/** Gives a key back after a failure on our side, so that the retry is worked on again. */
export async function releaseKey({ owner, key }: { owner: string; key: string }): Promise<void> {
  await database().query('DELETE FROM idempotency_keys WHERE owner = ? AND idempotencyKey = ?', {
    replacements: [owner, key],
    type: QueryTypes.DELETE,
  });
}

export async function forgetOldKeys(): Promise<void> {
  await database().query(
    `DELETE FROM idempotency_keys WHERE createdAt < UTC_TIMESTAMP(3) - INTERVAL ${keptHours} HOUR LIMIT 1000`,
    {
      type: QueryTypes.DELETE,
    },
  );
}
