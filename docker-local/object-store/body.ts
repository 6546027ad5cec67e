import { createHash } from 'node:crypto';
import { crc32 } from 'node:zlib';
import type { IncomingMessage } from 'node:http';
import { decodeChunks } from './chunks';
import { StoreError } from './errors';
import type { VerifiedSignature } from './signature';

export interface BodyFacts {
  byteLength: number;
  md5Hex: string;
  checksums: Record<string, string>;
}

const KNOWN_CHECKSUMS = ['crc32', 'sha1', 'sha256'];
const ABOUT_CHECKSUMS = new Set(['x-amz-checksum-mode', 'x-amz-checksum-algorithm', 'x-amz-checksum-type']);

function requireEqual(
  expected: string,
  actual: string | undefined,
  code: 'BadDigest' | 'XAmzContentSHA256Mismatch',
  what: string,
) {
  if (expected !== actual) throw new StoreError(code, `${what} does not match the bytes that arrived.`);
}

/**
 * Passes the request's bytes (decoded if sent in chunks) to `write`, then checks every digest the client gave:
 * x-amz-content-sha256, Content-MD5, x-amz-checksum-crc32/-sha1/-sha256 in headers or trailers.
 * Throws StoreError when one is wrong or the body is shorter than announced; the caller must then discard.
 */
export async function receiveBody(
  request: IncomingMessage,
  signature: VerifiedSignature,
  write: (bytes: Buffer) => Promise<void>,
): Promise<BodyFacts> {
  const { headers } = request;
  const chunked = signature.payloadHash.startsWith('STREAMING-');
  const announced = chunked ? headers['x-amz-decoded-content-length'] : headers['content-length'];
  const trailers: Record<string, string> = {};
  const md5Hash = createHash('md5');
  const asked = `${signature.payloadHash} ${Object.keys(headers).join(' ')} ${headers['x-amz-trailer'] ?? ''}`;
  const sha1Hash = asked.includes('checksum-sha1') ? createHash('sha1') : null;
  // Not computed for a body that is sent unsigned and without this checksum.
  const sha256Hash = /checksum-sha256|^[0-9a-f]{64} /.test(asked) ? createHash('sha256') : null;
  let crc = 0;
  let byteLength = 0;
  const source: AsyncIterable<Buffer> = chunked ? decodeChunks(request, signature, trailers) : request;
  for await (const bytes of source) {
    const writing = write(bytes);
    byteLength += bytes.length;
    crc = crc32(bytes, crc);
    md5Hash.update(bytes);
    sha1Hash?.update(bytes);
    sha256Hash?.update(bytes);
    await writing;
  }
  if (announced !== undefined && Number(announced) !== byteLength) {
    throw new StoreError('IncompleteBody', `Expected ${announced} bytes, received ${byteLength}.`);
  }
  const crcBytes = Buffer.alloc(4);
  crcBytes.writeUInt32BE(crc);
  const sha256 = sha256Hash?.digest();
  const md5 = md5Hash.digest();
  const actual: Record<string, string | undefined> = {
    crc32: crcBytes.toString('base64'),
    sha1: sha1Hash?.digest('base64'),
    sha256: sha256?.toString('base64'),
  };
  if (!chunked && signature.payloadHash !== 'UNSIGNED-PAYLOAD') {
    requireEqual(
      signature.payloadHash,
      sha256?.toString('hex'),
      'XAmzContentSHA256Mismatch',
      'x-amz-content-sha256',
    );
  }
  if (headers['content-md5'])
    requireEqual(String(headers['content-md5']), md5.toString('base64'), 'BadDigest', 'Content-MD5');

  const checksums: Record<string, string> = {};
  const given = { ...headers, ...trailers };
  const promised = String(headers['x-amz-trailer'] ?? '').split(',');
  const missing = promised.map((name) => name.trim()).find((name) => name && trailers[name] === undefined);
  if (missing) throw new StoreError('IncompleteBody', `The trailer ${missing} is missing.`);
  for (const [name, value] of Object.entries(given)) {
    if (!name.startsWith('x-amz-checksum-') || ABOUT_CHECKSUMS.has(name)) continue;
    const algorithm = name.slice('x-amz-checksum-'.length);
    // Refused rather than stored unchecked.
    if (!KNOWN_CHECKSUMS.includes(algorithm))
      throw new StoreError('NotImplemented', `${name} cannot be verified here.`);
    requireEqual(String(value), actual[algorithm], 'BadDigest', name);
    checksums[algorithm] = String(value);
  }
  return { byteLength, md5Hex: md5.toString('hex'), checksums };
}
