import type { Actor } from '@/lib/auth/actor';
import { type Claim, claimKey, digestOfRequest, keepAnswer, releaseKey } from './idempotency';
import { problemResponse } from './problem-response';
import { originOf } from '@/lib/auth/current-actor';

/** The owner of an idempotency key: two callers may use the same key without meeting. */
export function keyOwner(actor: Actor): string {
  return actor.kind === 'user'
    ? `user:${actor.userId}`
    : actor.kind === 'token'
      ? `token:${actor.tokenId}`
      : 'system';
}

/**
 * Runs `work` once for an `Idempotency-Key`: a repeat of the same request gets the kept answer. An
 * answer of our own failure (5xx) or of a throttle is not kept, so that the retry is worked on.
 */
export async function answerOnce(
  request: Request,
  actor: Actor,
  body: string,
  work: () => Promise<Response>,
): Promise<Response> {
  const key = request.headers.get('idempotency-key');
  if (!key) return work();
  const claim: Claim = {
    owner: keyOwner(actor),
    key,
    digest: digestOfRequest(request.method, new URL(request.url), request.headers.get('if-match'), body),
  };
  const kept = await claimKey(claim);
  if (kept) {
    return new Response(kept.status === 204 ? null : kept.body, {
      status: kept.status,
      headers: {
        'content-type': kept.contentType,
        'idempotent-replay': 'true',
        'cache-control': 'no-store',
        'x-content-type-options': 'nosniff',
      },
    });
  }
  let response: Response;
  try {
    response = await work();
  } catch (error) {
    response = problemResponse(error, originOf(request.headers).requestId);
  }
  if (response.status >= 500 || response.status === 429) {
    await releaseKey(claim);
    return response;
  }
  const text = await response.clone().text();
  await keepAnswer(claim, {
    status: response.status,
    contentType: response.headers.get('content-type') ?? 'application/json',
    body: text,
  });
  return response;
}
