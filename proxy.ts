import { type NextRequest, NextResponse } from 'next/server';

/**
 * Gives each page its Content-Security-Policy with a fresh nonce. It guards nothing else: who may
 * see what is decided where the data is read.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.randomUUID()).toString('base64');
  const dev = process.env.NODE_ENV === 'development';
  const policy = [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${dev ? " 'unsafe-eval'" : ''}`,
    // Charts and drag handles set widths and positions through the style attribute.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    `connect-src 'self'${dev ? ' ws:' : ''}`,
    "object-src 'none'",
    "base-uri 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('x-page', request.nextUrl.pathname + request.nextUrl.search);
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  response.headers.set('referrer-policy', 'same-origin');
  response.headers.set('x-content-type-options', 'nosniff');
  response.headers.set('permissions-policy', 'camera=(self), microphone=(), geolocation=()');
  return response;
}

// The API stays outside: a proxy would buffer, and silently cut, bodies over 10 MB.
export const config = { matcher: ['/((?!api/|_next/static|_next/image|icon.svg|.*\\.(?:svg|png|mjs)$).*)'] };
