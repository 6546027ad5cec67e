import { setTimeout as wait } from 'node:timers/promises';
import { HeadObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { objectStore, statusOf, StorageError, type ObjectStore } from './client';
import { objectKeyFor } from './keys';
import { spoolFile, type SpooledFile, type SpoolOptions } from './spool-file';

export interface StoredObject {
  key: string;
  sha256Hex: string;
  byteLength: number;
  /** True when the same bytes were in the store before: an identical upload is not an error. */
  alreadyThere: boolean;
}

const MAX_ATTEMPTS = 3;

/** 409 is S3's answer to two conditional puts at once; network failures have no status. */
function mayTryAgain(error: unknown): boolean {
  const status = statusOf(error);
  return status === undefined || status >= 500 || status === 409 || status === 429;
}

async function requireSameLength(store: ObjectStore, key: string, byteLength: number): Promise<void> {
  const head = await store.client.send(new HeadObjectCommand({ Bucket: store.bucket, Key: key }));
  if (head.ContentLength !== byteLength) {
    throw new StorageError(
      `The stored object has ${head.ContentLength} bytes, expected ${byteLength}: restore it from backup.`,
      key,
    );
  }
}

/**
 * Puts a spooled file under its digest's key. The store verifies the SHA-256 and writes only if the key is free;
 * "already there" is success, because the key is the digest. Throws StorageError when the store does not take it.
 */
export async function putSpooledFile(
  file: SpooledFile,
  contentType: string,
  store = objectStore(),
): Promise<StoredObject> {
  const { sha256Hex, byteLength } = file;
  const key = objectKeyFor(sha256Hex);
  for (let attempt = 1; ; attempt += 1) {
    const body = file.openStream();
    try {
      await store.client.send(
        new PutObjectCommand({
          Bucket: store.bucket,
          Key: key,
          Body: body,
          ContentLength: byteLength,
          ContentType: contentType,
          ChecksumSHA256: Buffer.from(sha256Hex, 'hex').toString('base64'),
          IfNoneMatch: '*',
        }),
      );
      return { key, sha256Hex, byteLength, alreadyThere: false };
    } catch (error) {
      if (statusOf(error) === 412) {
        await requireSameLength(store, key, byteLength);
        return { key, sha256Hex, byteLength, alreadyThere: true };
      }
      if (attempt === MAX_ATTEMPTS || !mayTryAgain(error)) {
        throw new StorageError(
          'The object store did not take the file. Try again; if it stays, check GET /api/health.',
          key,
          { cause: error },
        );
      }
      await wait(100 * 4 ** (attempt - 1));
    } finally {
      body.destroy();
    }
  }
}

/** Streams bytes whose digest is not known yet into the store: spool while hashing, then one verified put. */
export async function putObject(
  source: AsyncIterable<Uint8Array>,
  { contentType, ...spool }: { contentType: string } & SpoolOptions,
  store = objectStore(),
): Promise<StoredObject> {
  const file = await spoolFile(source, spool);
  try {
    return await putSpooledFile(file, contentType, store);
  } finally {
    await file.discard();
  }
}
