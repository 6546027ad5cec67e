import type { Readable } from 'node:stream';
import type { EvidenceFile } from '@/lib/database/records';
import { Problem } from '@/lib/errors';
import { objectKeyFor } from '@/storage/keys';
import { openObject, openObjectRange } from '@/storage/read-object';
import { readRange } from './byte-range';
import { contentDisposition } from './file-name';
import { isPhotoType } from './kinds';

/** Gives a Node stream to a web response piece by piece as it is read, and closes it when the reader goes away. */
function pulled(body: Readable): ReadableStream<Uint8Array> {
  const pieces = body[Symbol.asyncIterator]() as AsyncIterator<Buffer>;
  return new ReadableStream<Uint8Array>(
    {
      async pull(controller) {
        const { done, value } = await pieces.next();
        if (done) controller.close();
        else controller.enqueue(new Uint8Array(value.buffer, value.byteOffset, value.byteLength));
      },
      cancel() {
        body.destroy();
      },
    },
    { highWaterMark: 0 },
  );
}

function matches(header: string | null, tag: string): boolean {
  return (
    header !== null &&
    (header.trim() === '*' || header.split(',').some((one) => one.trim().replace(/^W\//, '') === tag))
  );
}

/**
 * The original bytes with their SHA-256 as entity tag: 304 for a known one, 206 for a part, 416 for a part beyond the
 * end. A whole file that is found damaged while it is sent ends in an error, never cleanly.
 */
export async function streamContent(evidence: EvidenceFile, request: Request): Promise<Response> {
  const tag = `"${evidence.sha256}"`;
  const sizeBytes = Number(evidence.sizeBytes);
  const headers = new Headers({
    etag: tag,
    'cache-control': 'private, max-age=31536000, immutable',
    'accept-ranges': 'bytes',
    'x-content-type-options': 'nosniff',
    // A file of somebody else's is never a page of ours.
    'content-security-policy': "default-src 'none'; sandbox",
    vary: 'Cookie, Authorization',
  });
  if (matches(request.headers.get('if-none-match'), tag)) return new Response(null, { status: 304, headers });
  const ifRange = request.headers.get('if-range');
  const range = readRange(
    ifRange === null || ifRange.trim() === tag ? request.headers.get('range') : null,
    sizeBytes,
  );
  if (range.kind === 'unsatisfiable') {
    return new Response(null, { status: 416, headers: { 'content-range': `bytes */${sizeBytes}` } });
  }
  const isPhoto = isPhotoType(evidence.mediaType);
  headers.set('content-type', evidence.mediaType);
  headers.set(
    'content-disposition',
    contentDisposition(isPhoto ? 'inline' : 'attachment', evidence.fileName),
  );
  const key = objectKeyFor(evidence.sha256);
  if (range.kind === 'part') {
    headers.set('content-range', `bytes ${range.first}-${range.last}/${sizeBytes}`);
    headers.set('content-length', String(range.last - range.first + 1));
    return new Response(pulled(await openObjectRange(key, range)), { status: 206, headers });
  }
  headers.set('content-length', String(sizeBytes));
  headers.set('repr-digest', `sha-256=:${Buffer.from(evidence.sha256, 'hex').toString('base64')}:`);
  return new Response(pulled(await openObject(key)), { status: 200, headers });
}

/** 404 for a picture of what is no picture. */
export function requirePhoto(evidence: EvidenceFile): void {
  if (isPhotoType(evidence.mediaType)) return;
  throw new Problem(
    'not-found',
    'There is no preview of this file: only photos have one. Download its content instead.',
  );
}
