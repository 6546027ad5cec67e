import { randomUUID } from 'node:crypto';
import { BaseError, ConnectionError, OptimisticLockError, UniqueConstraintError } from 'sequelize';
import { type ErrorCode, errorTable, Problem } from '@/lib/errors';
import { log } from '@/lib/log';
import { StorageError } from '@/storage/client';

function body(
  code: ErrorCode,
  detail: string,
  requestId: string,
  errors?: { path: string; message: string }[],
) {
  const { status, title } = errorTable[code];
  return {
    type: `urn:heartcut:problem:${code}`,
    title,
    status,
    detail,
    instance: `urn:request:${requestId}`,
    ...(errors && { errors }),
  };
}

/** What of an unexpected error may be told: a full pool or a lost connection is "away", the rest is ours. */
function translate(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof OptimisticLockError) {
    return new Problem(
      'version-conflict',
      'Somebody else changed this a moment ago. Reload it, then make your change again.',
    );
  }
  if (error instanceof UniqueConstraintError) {
    return new Problem(
      'already-exists',
      'This exists already. Open the one that is there, or choose another name.',
    );
  }
  const storeName = (error as { name?: string; code?: string })?.code ?? '';
  const storeAway = ['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'EPIPE', 'ENOTFOUND'].includes(storeName);
  if (error instanceof ConnectionError || error instanceof StorageError || storeAway) {
    return new Problem(
      'unavailable',
      'The database or the file store does not answer. Nothing was saved; try again in a moment.',
      {
        retryAfterSeconds: 5,
      },
    );
  }
  return new Problem(
    'internal',
    'This is an error of ours. Nothing was saved. Try again, and report the request number if it stays.',
  );
}

/** Any error as RFC 9457 problem details, never with a stack, SQL or a path. Unexpected ones are logged. */
export function problemResponse(error: unknown, requestId: string = randomUUID()): Response {
  const problem = translate(error);
  if (problem.code === 'internal' || problem.code === 'unavailable') {
    const original = error instanceof BaseError ? ((error as { original?: Error }).original ?? error) : error;
    log().error({ requestId, err: original }, 'request failed');
  }
  const headers = new Headers({
    'content-type': 'application/problem+json',
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    'x-request-id': requestId,
  });
  if (problem.extra.retryAfterSeconds) headers.set('retry-after', String(problem.extra.retryAfterSeconds));
  if (problem.status === 401) headers.set('www-authenticate', 'Bearer realm="heartcut"');
  return new Response(JSON.stringify(body(problem.code, problem.detail, requestId, problem.extra.errors)), {
    status: problem.status,
    headers,
  });
}
