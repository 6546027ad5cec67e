import { env } from '@/lib/env';
import { Problem } from '@/lib/errors';

const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

export function isUnsafe(method: string): boolean {
  return !safe.has(method.toUpperCase());
}

/**
 * A browser session may only change things from our own pages: the Origin header, which scripts
 * cannot forge, must be this host or the public address.
 */
export function requireSameOrigin(request: Request): void {
  if (!isUnsafe(request.method)) return;
  const origin = request.headers.get('origin');
  const host = request.headers.get('host');
  const fine =
    origin !== null && URL.canParse(origin) && (origin === env().publicUrl || new URL(origin).host === host);
  if (!fine) {
    throw new Problem(
      'foreign-origin',
      'Send this request from a page of Heartcut, or with the header Origin set to its address.',
    );
  }
}
