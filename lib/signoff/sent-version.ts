import { requireIfMatch } from '@/lib/http/version';

/** The version in If-Match where one was sent; null where none was: then the state table alone decides. */
export function sentVersion(request: Request): number | null {
  return request.headers.has('if-match') ? requireIfMatch(request) : null;
}
