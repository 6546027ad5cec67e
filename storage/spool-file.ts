import { createHash, randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Readable } from 'node:stream';

/** Bytes that have arrived completely and whose digest is known, but which are not in the store yet. */
export interface SpooledFile {
  path: string;
  byteLength: number;
  sha256Hex: string;
  openStream: () => Readable;
  /** Removes the temporary file; call it in `finally`. */
  discard: () => Promise<void>;
}

export class TooLargeError extends Error {
  constructor(readonly maxBytes: number) {
    super(`The file is larger than ${maxBytes} bytes.`);
    this.name = 'TooLargeError';
  }
}

const READ_BYTES = 256 * 1024;

export interface SpoolOptions {
  /** Reading stops with TooLargeError beyond this. */
  maxBytes?: number;
  /** Default: a folder of the system's temporary directory. */
  folder?: string;
}

/**
 * Streams `source` to a temporary file while hashing; memory stays flat whatever the size.
 *
 * Why a temporary file, and not a multipart upload to a staging key followed by a copy to the digest's key:
 * the digest is known before the store sees a byte, so the store itself can verify it and refuse to overwrite
 * (S3 takes `If-None-Match: *` on a put, not on every copy); a refused or broken upload leaves nothing in the
 * store to collect; the type can be sniffed and a photo decoded from a local file first; and a put that fails on
 * the way can be sent again. The price is that the bytes pass the local disk once.
 */
export async function spoolFile(
  source: AsyncIterable<Uint8Array>,
  options: SpoolOptions = {},
): Promise<SpooledFile> {
  const { maxBytes = Infinity, folder = join(tmpdir(), 'heartcut-spool') } = options;
  await mkdir(/*turbopackIgnore: true*/ folder, { recursive: true, mode: 0o700 });
  const path = join(/*turbopackIgnore: true*/ folder, randomUUID());
  const hash = createHash('sha256');
  let byteLength = 0;
  const handle = await open(/*turbopackIgnore: true*/ path, 'wx', 0o600);
  try {
    for await (const bytes of source) {
      byteLength += bytes.length;
      if (byteLength > maxBytes) throw new TooLargeError(maxBytes);
      // Hashing goes on while the disk takes the bytes.
      const writing = handle.appendFile(bytes);
      hash.update(bytes);
      await writing;
    }
  } catch (error) {
    await rm(path, { force: true });
    throw error;
  } finally {
    await handle.close();
  }
  return {
    path,
    byteLength,
    sha256Hex: hash.digest('hex'),
    openStream: () => createReadStream(/*turbopackIgnore: true*/ path, { highWaterMark: READ_BYTES }),
    discard: () => rm(path, { force: true }),
  };
}
