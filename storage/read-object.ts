import { createHash } from 'node:crypto';
import { Transform, type Readable } from 'node:stream';
import { GetObjectCommand, HeadObjectCommand } from '@aws-sdk/client-s3';
import { objectStore, statusOf, StorageError, type ObjectStore } from './client';
import { sha256FromKey } from './keys';

/** First and last byte, both included and counted from 0, as in HTTP ranges. */
export interface ByteRange {
  first: number;
  last: number;
}

async function getBody(store: ObjectStore, key: string, range?: ByteRange): Promise<Readable> {
  try {
    const answer = await store.client.send(
      new GetObjectCommand({
        Bucket: store.bucket,
        Key: key,
        Range: range ? `bytes=${range.first}-${range.last}` : undefined,
      }),
    );
    return answer.Body as Readable;
  } catch (error) {
    const message =
      statusOf(error) === 404
        ? 'The stored file is missing: restore it from backup.'
        : 'The object store did not give the file.';
    throw new StorageError(message, key, { cause: error });
  }
}

/**
 * The whole object as a stream. The last bytes are held back until the digest was found right; a damaged object
 * ends in a StorageError instead of a clean end, so no reader can take it for complete.
 */
export async function openObject(key: string, store = objectStore()): Promise<Readable> {
  const expected = sha256FromKey(key);
  const body = await getBody(store, key);
  const hash = createHash('sha256');
  let held: Buffer | null = null;
  const verifier = new Transform({
    transform(bytes: Buffer, _encoding, done) {
      hash.update(bytes);
      if (held) this.push(held);
      held = bytes;
      done();
    },
    flush(done) {
      if (hash.digest('hex') !== expected)
        return done(
          new StorageError('The stored file is damaged: its SHA-256 is not the recorded one.', key),
        );
      done(null, held);
    },
  });
  body.once('error', (cause) =>
    verifier.destroy(new StorageError('The file broke off while it was read.', key, { cause })),
  );
  verifier.once('close', () => body.destroy());
  return body.pipe(verifier);
}

/** One range of an object as a stream. A part cannot be checked against the digest of the whole. */
export async function openObjectRange(
  key: string,
  range: ByteRange,
  store = objectStore(),
): Promise<Readable> {
  sha256FromKey(key);
  return getBody(store, key, range);
}

/** The whole object in memory, verified; throws StorageError beyond `maxBytes`. For files that are parsed anyway. */
export async function readObject(
  key: string,
  { maxBytes }: { maxBytes: number },
  store = objectStore(),
): Promise<Buffer> {
  const parts: Buffer[] = [];
  let byteLength = 0;
  for await (const bytes of await openObject(key, store)) {
    byteLength += (bytes as Buffer).length;
    if (byteLength > maxBytes) throw new StorageError(`The file is larger than ${maxBytes} bytes.`, key);
    parts.push(bytes as Buffer);
  }
  return Buffer.concat(parts);
}

/** Size in bytes of a stored object, or null when there is none. Throws StorageError when the store fails. */
export async function findObjectByteLength(key: string, store = objectStore()): Promise<number | null> {
  try {
    const head = await store.client.send(new HeadObjectCommand({ Bucket: store.bucket, Key: key }));
    return head.ContentLength ?? null;
  } catch (error) {
    if (statusOf(error) === 404) return null;
    throw new StorageError('The object store did not answer.', key, { cause: error });
  }
}

/** Reads an object through without keeping it, for the integrity check. */
export async function verifyObject(
  key: string,
  store = objectStore(),
): Promise<'intact' | 'damaged' | 'missing'> {
  if ((await findObjectByteLength(key, store)) === null) return 'missing';
  const hash = createHash('sha256');
  for await (const bytes of await getBody(store, key)) hash.update(bytes as Buffer);
  return hash.digest('hex') === sha256FromKey(key) ? 'intact' : 'damaged';
}
