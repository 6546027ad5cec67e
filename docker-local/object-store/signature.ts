import { timingSafeEqual } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import { Sha256 } from '@aws-crypto/sha256-js';
import { SignatureV4 } from '@smithy/signature-v4';
import { StoreError } from './errors';

export interface Credentials {
  accessKeyId: string;
  secretAccessKey: string;
}

/** A request whose signature was found right. `signText` is the keyed signature of further text (chunks). */
export interface VerifiedSignature {
  payloadHash: string;
  seedSignature: string;
  amzDate: string;
  scope: string;
  signText: (text: string) => Promise<string>;
}

const MAX_CLOCK_SKEW_MS = 15 * 60_000;
const MAX_PRESIGNED_S = 7 * 24 * 3600;

/** Query as name -> value(s). `+` stays `+`: S3 clients percent-encode spaces, unlike HTML forms. */
export function parseQuery(rawQuery: string): Record<string, string | string[]> {
  const query: Record<string, string | string[]> = {};
  for (const pair of rawQuery.split('&').filter(Boolean)) {
    const cut = pair.indexOf('=');
    const name = decodeURIComponent(cut < 0 ? pair : pair.slice(0, cut));
    const value = cut < 0 ? '' : decodeURIComponent(pair.slice(cut + 1));
    const before = query[name];
    query[name] = before === undefined ? value : [...(Array.isArray(before) ? before : [before]), value];
  }
  return query;
}

function parseAmzDate(text: string): Date {
  const match = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(text);
  if (!match) throw new StoreError('AccessDenied', 'The request carries no valid date.');
  return new Date(`${match[1]}-${match[2]}-${match[3]}T${match[4]}:${match[5]}:${match[6]}Z`);
}

function requireSame(expected: string, given: string): void {
  const [a, b] = [Buffer.from(expected), Buffer.from(given)];
  if (a.length !== b.length || !timingSafeEqual(a, b)) {
    throw new StoreError(
      'SignatureDoesNotMatch',
      'The signature does not match: check the secret key and region.',
    );
  }
}

function readClaims(request: IncomingMessage, query: Record<string, string | string[]>) {
  const header = request.headers.authorization;
  if (header) {
    const match =
      /^AWS4-HMAC-SHA256 Credential=([^,\s]+),\s*SignedHeaders=([^,\s]+),\s*Signature=([0-9a-f]{64})$/.exec(
        header,
      );
    if (!match) throw new StoreError('AccessDenied', 'Only AWS Signature Version 4 is accepted.');
    const amzDate = String(request.headers['x-amz-date'] ?? '');
    return {
      presigned: false,
      credential: match[1]!,
      signedHeaders: match[2]!,
      signature: match[3]!,
      amzDate,
    };
  }
  const pick = (name: string) => (typeof query[name] === 'string' ? (query[name] as string) : '');
  if (pick('X-Amz-Algorithm') !== 'AWS4-HMAC-SHA256')
    throw new StoreError('AccessDenied', 'The request is not signed.');
  return {
    presigned: true,
    credential: pick('X-Amz-Credential'),
    signedHeaders: pick('X-Amz-SignedHeaders'),
    signature: pick('X-Amz-Signature'),
    amzDate: pick('X-Amz-Date'),
  };
}

function requireInTime(presigned: boolean, signedAt: Date, expires: unknown): void {
  const ageMs = Date.now() - signedAt.getTime();
  if (!presigned) {
    if (Math.abs(ageMs) > MAX_CLOCK_SKEW_MS)
      throw new StoreError('RequestTimeTooSkewed', 'The request date is too far from now.');
    return;
  }
  const seconds = Number(expires);
  if (!(seconds > 0 && seconds <= MAX_PRESIGNED_S))
    throw new StoreError('AccessDenied', 'X-Amz-Expires is not valid.');
  if (ageMs > seconds * 1000 || ageMs < -MAX_CLOCK_SKEW_MS)
    throw new StoreError('AccessDenied', 'Request has expired');
}

/**
 * Recomputes the signature with the AWS client's own signer and compares.
 * Throws a 403 StoreError for an unsigned, wrongly signed or expired request.
 * Source: AWS Signature Version 4, "Authenticating Requests" (Amazon S3 API Reference).
 */
export async function verifySignature(
  request: IncomingMessage,
  credentials: Credentials,
): Promise<VerifiedSignature> {
  const [path = '/', rawQuery = ''] = (request.url ?? '/').split(/\?(.*)/s);
  const query = parseQuery(rawQuery);
  const claims = readClaims(request, query);
  const [accessKeyId, shortDate, region = '', service = '', terminator] = claims.credential.split('/');
  if (accessKeyId !== credentials.accessKeyId)
    throw new StoreError('InvalidAccessKeyId', 'The access key is not known here.');
  const signingDate = parseAmzDate(claims.amzDate);
  if (!claims.amzDate.startsWith(shortDate!) || service !== 's3' || terminator !== 'aws4_request') {
    throw new StoreError('SignatureDoesNotMatch', 'The credential scope is not valid.');
  }
  requireInTime(claims.presigned, signingDate, query['X-Amz-Expires']);

  const names = claims.signedHeaders.split(';');
  if (!names.includes('host'))
    throw new StoreError('SignatureDoesNotMatch', 'The host header must be signed.');
  const unsigned = Object.keys(request.headers).filter(
    (name) => name.startsWith('x-amz-') && !names.includes(name),
  );
  // Headers that a signature does not cover could be changed on the way.
  const harmless = new Set(['x-amz-content-sha256', 'x-amz-user-agent']);
  if (unsigned.some((name) => !harmless.has(name))) {
    throw new StoreError(
      'AccessDenied',
      `Headers present in the request were not signed: ${unsigned.join(', ')}`,
    );
  }
  const headers = Object.fromEntries(names.map((name) => [name, String(request.headers[name] ?? '')]));
  const payloadHash = claims.presigned
    ? String(query['X-Amz-Content-Sha256'] ?? headers['x-amz-content-sha256'] ?? 'UNSIGNED-PAYLOAD')
    : String(request.headers['x-amz-content-sha256'] ?? '');
  if (!payloadHash) throw new StoreError('AccessDenied', 'x-amz-content-sha256 is missing.');

  const signer = new SignatureV4({
    credentials,
    region,
    service,
    sha256: Sha256,
    uriEscapePath: false,
    applyChecksum: false,
  });
  const url = { method: request.method!, protocol: 'http:', hostname: '', path };
  if (claims.presigned) {
    const own = ['Algorithm', 'Credential', 'Date', 'Expires', 'SignedHeaders', 'Signature'].map(
      (name) => `X-Amz-${name}`,
    );
    const rest = Object.fromEntries(Object.entries(query).filter(([name]) => !own.includes(name)));
    const keep = new Set([...names, 'x-amz-content-sha256']);
    const signed = await signer.presign(
      { ...url, query: rest, headers: { ...headers, 'x-amz-content-sha256': payloadHash } },
      {
        signingDate,
        expiresIn: Number(query['X-Amz-Expires']),
        unhoistableHeaders: keep,
        signableHeaders: new Set(names),
        unsignableHeaders: new Set(names.includes('x-amz-content-sha256') ? [] : ['x-amz-content-sha256']),
      },
    );
    requireSame(String(signed.query?.['X-Amz-Signature']), claims.signature);
  } else {
    const signed = await signer.sign(
      { ...url, query, headers: { ...headers, 'x-amz-content-sha256': payloadHash } },
      { signingDate, signableHeaders: new Set(names) },
    );
    requireSame(
      /Signature=([0-9a-f]+)/.exec(signed.headers.authorization ?? '')?.[1] ?? '',
      claims.signature,
    );
  }
  return {
    payloadHash,
    seedSignature: claims.signature,
    amzDate: claims.amzDate,
    scope: `${shortDate}/${region}/s3/aws4_request`,
    signText: (text) => signer.sign(text, { signingDate }),
  };
}
