import type { IncomingMessage, ServerResponse } from 'node:http';
import { open } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import { Transform } from 'node:stream';
import type { BucketStore, ObjectRecord } from './bucket-store';
import { StoreError } from './errors';
import type { Faults } from './faults';

/** First and last byte of a single range; null when the header is absent or not one that this store understands. */
export function parseRange(
  header: string | undefined,
  byteLength: number,
): { first: number; last: number } | null {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header ?? '');
  if (!match || (match[1] === '' && match[2] === '')) return null;
  const first = match[1] === '' ? Math.max(0, byteLength - Number(match[2])) : Number(match[1]);
  const last =
    match[1] === '' || match[2] === '' ? byteLength - 1 : Math.min(Number(match[2]), byteLength - 1);
  if (first > last) throw new StoreError('InvalidRange', 'The requested range is not satisfiable');
  return { first, last };
}

function faultyBody(faults: Faults): Transform {
  let offset = 0;
  return new Transform({
    transform(bytes: Buffer, _encoding, done) {
      const at = (faults.flipByteAt ?? -1) - offset;
      let out = bytes;
      if (at >= 0 && at < bytes.length) {
        out = Buffer.from(bytes);
        out[at] = out[at]! ^ 0xff;
      }
      const keep = (faults.truncateAfterBytes ?? Infinity) - offset;
      offset += bytes.length;
      if (keep < out.length) {
        this.push(out.subarray(0, Math.max(0, keep)));
        // Lets what was pushed leave before the connection is cut.
        setTimeout(() => done(new Error('truncated on demand')), 50);
        return;
      }
      done(null, out);
    },
  });
}

async function openData(bucket: BucketStore, key: string) {
  for (let attempt = 0; ; attempt += 1) {
    const record = bucket.require(key);
    try {
      return { record, handle: await open(bucket.dataPath(record), 'r') };
    } catch (error) {
      // Overwritten between the look-up and the opening: look again.
      if (attempt === 3) throw error;
    }
  }
}

function objectHeaders(record: ObjectRecord): Record<string, string> {
  return {
    ETag: `"${record.etag}"`,
    'Last-Modified': new Date(record.lastModified).toUTCString(),
    'Content-Type': record.contentType,
    'Accept-Ranges': 'bytes',
    ...Object.fromEntries(
      Object.entries(record.metadata).map(([name, value]) => [`x-amz-meta-${name}`, value]),
    ),
  };
}

/** Answers GET and HEAD of an object, whole or one range of it. */
export async function sendObject(
  request: IncomingMessage,
  response: ServerResponse,
  bucket: BucketStore,
  key: string,
  overrides: Record<string, string>,
  faults: Faults,
): Promise<void> {
  const { record, handle } = await openData(bucket, key);
  try {
    const headers = { ...objectHeaders(record), ...overrides };
    const range = parseRange(request.headers.range, record.byteLength);
    const [first, last] = range ? [range.first, range.last] : [0, record.byteLength - 1];
    if (range) headers['Content-Range'] = `bytes ${first}-${last}/${record.byteLength}`;
    else if (request.headers['x-amz-checksum-mode'] === 'ENABLED') {
      for (const [name, value] of Object.entries(record.checksums)) headers[`x-amz-checksum-${name}`] = value;
    }
    headers['Content-Length'] = String(last - first + 1);
    response.writeHead(range ? 206 : 200, headers);
    if (request.method === 'HEAD' || last < first) {
      response.end();
      return;
    }
    const body = handle.createReadStream({ start: first, end: last, autoClose: false });
    const faulty = faults.flipByteAt !== undefined || faults.truncateAfterBytes !== undefined;
    await (faulty ? pipeline(body, faultyBody(faults), response) : pipeline(body, response));
  } finally {
    await handle.close();
  }
}
