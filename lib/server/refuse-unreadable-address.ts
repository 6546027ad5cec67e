import type { ServerResponse } from 'node:http';

function isReadable(pathname: string): boolean {
  try {
    decodeURIComponent(pathname);
    return true;
  } catch {
    return false;
  }
}

const detail =
  'The address is not readable: a percent sign in it begins no character. Check the link, or type it again.';

/**
 * Answers 400 to an address whose percent-encoding is no UTF-8 (RFC 3986, 2.1 and 2.5): a problem to a program, a
 * sentence to a person. True when it answered.
 */
export function refuseUnreadableAddress(url: string, requestId: string, response: ServerResponse): boolean {
  const [pathname = ''] = url.split('?', 1);
  if (isReadable(pathname)) return false;
  const forProgram = pathname.startsWith('/api/');
  const problem = {
    type: 'urn:heartcut:problem:malformed',
    title: 'The request could not be read',
    status: 400,
    detail,
    instance: `urn:request:${requestId}`,
  };
  response.writeHead(400, {
    'content-type': forProgram ? 'application/problem+json' : 'text/plain; charset=utf-8',
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    'x-request-id': requestId,
  });
  response.end(forProgram ? JSON.stringify(problem) : `${detail}\n`);
  return true;
}
