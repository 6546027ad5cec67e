import { originOf } from '@/lib/auth/current-actor';
import { Problem } from '@/lib/errors';
import { problemResponse } from './problem-response';

/** 404 as problem details for an address that leads nowhere. */
export function answerUnknownAddress(request: Request): Response {
  const problem = new Problem(
    'not-found',
    'There is nothing at this address. Compare it with the list at /api/v1/openapi.json.',
  );
  return problemResponse(problem, originOf(request.headers).requestId);
}
