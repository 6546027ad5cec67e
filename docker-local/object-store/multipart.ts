import { createHash, randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, readdir, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { BucketStore, ObjectRecord } from './bucket-store';
import { StoreError } from './errors';
import type { PendingFile } from './disk';

/** Amazon S3 User Guide, "Amazon S3 multipart upload limits": every part but the last has at least 5 MiB. */
const MIN_PART_BYTES = 5 * 1024 * 1024;

export interface UploadRecord {
  uploadId: string;
  key: string;
  initiated: string;
  contentType: string;
  metadata: Record<string, string>;
}
export interface PartRecord {
  partNumber: number;
  etag: string;
  byteLength: number;
  fileName: string;
}

/** Multipart uploads of one bucket. A part's file name says its number, MD5 and size, so a restart forgets nothing. */
export class MultipartUploads {
  constructor(private readonly bucket: BucketStore) {}

  private folder(...names: string[]): string {
    return join(this.bucket.folder, 'uploads', ...names);
  }

  async begin(facts: Pick<UploadRecord, 'key' | 'contentType' | 'metadata'>): Promise<UploadRecord> {
    const upload = { ...facts, uploadId: randomUUID(), initiated: new Date().toISOString() };
    await mkdir(this.folder(upload.uploadId), { recursive: true });
    const file = await this.bucket.createPending();
    await file.write(Buffer.from(JSON.stringify(upload)));
    await file.publish(this.folder(upload.uploadId, 'upload.json'));
    return upload;
  }

  async require(uploadId: string, key: string): Promise<UploadRecord> {
    const valid = /^[0-9a-f-]{36}$/.test(uploadId);
    const text = valid
      ? await readFile(this.folder(uploadId, 'upload.json'), 'utf8').catch(() => null)
      : null;
    const upload = text === null ? null : (JSON.parse(text) as UploadRecord);
    if (upload?.key !== key)
      throw new StoreError('NoSuchUpload', 'The specified multipart upload does not exist.');
    return upload;
  }

  async list(prefix: string): Promise<UploadRecord[]> {
    const ids = await readdir(this.folder()).catch(() => [] as string[]);
    const texts = await Promise.all(
      ids.map((id) => readFile(this.folder(id, 'upload.json'), 'utf8').catch(() => null)),
    );
    const uploads = texts.flatMap((text) => (text === null ? [] : [JSON.parse(text) as UploadRecord]));
    return uploads.filter((upload) => upload.key.startsWith(prefix));
  }

  async listParts(uploadId: string): Promise<PartRecord[]> {
    const names = (await readdir(this.folder(uploadId))).filter((name) => /^\d{5}-/.test(name)).sort();
    return names.map((fileName) => {
      const [number, etag = '', bytes] = fileName.split('-');
      return { partNumber: Number(number), etag, byteLength: Number(bytes), fileName };
    });
  }

  async addPart(uploadId: string, part: Omit<PartRecord, 'fileName'>, pending: PendingFile): Promise<void> {
    const prefix = `${String(part.partNumber).padStart(5, '0')}-`;
    const fileName = `${prefix}${part.etag}-${part.byteLength}`;
    await pending.publish(this.folder(uploadId, fileName));
    for (const name of await readdir(this.folder(uploadId))) {
      if (name.startsWith(prefix) && name !== fileName)
        await rm(this.folder(uploadId, name), { force: true });
    }
  }

  async complete(
    upload: UploadRecord,
    wanted: { partNumber: number; etag: string }[],
    options: { onlyIfAbsent: boolean },
  ): Promise<ObjectRecord> {
    const present = new Map((await this.listParts(upload.uploadId)).map((part) => [part.partNumber, part]));
    if (wanted.length === 0) throw new StoreError('MalformedXML', 'The list of parts is empty.');
    const parts = wanted.map(({ partNumber, etag }, index) => {
      const part = present.get(partNumber);
      const inOrder = index === 0 || wanted[index - 1]!.partNumber < partNumber;
      if (!part || part.etag !== etag || !inOrder)
        throw new StoreError('InvalidPart', `Part ${partNumber} was not found.`);
      if (index < wanted.length - 1 && part.byteLength < MIN_PART_BYTES) {
        throw new StoreError('EntityTooSmall', `Part ${partNumber} is smaller than 5 MiB.`);
      }
      return part;
    });
    if (options.onlyIfAbsent) this.bucket.requireAbsent(upload.key);
    const whole = await this.bucket.createPending();
    try {
      for (const part of parts) {
        for await (const bytes of createReadStream(this.folder(upload.uploadId, part.fileName)))
          await whole.write(bytes);
      }
      const md5OfMd5s = createHash('md5');
      for (const part of parts) md5OfMd5s.update(Buffer.from(part.etag, 'hex'));
      const record = await this.bucket.commit(
        whole,
        {
          key: upload.key,
          byteLength: parts.reduce((sum, part) => sum + part.byteLength, 0),
          etag: `${md5OfMd5s.digest('hex')}-${parts.length}`,
          contentType: upload.contentType,
          metadata: upload.metadata,
          checksums: {},
        },
        options,
      );
      await this.abort(upload.uploadId);
      return record;
    } catch (error) {
      await whole.discard();
      throw error;
    }
  }

  async abort(uploadId: string): Promise<void> {
    await rm(this.folder(uploadId), { recursive: true, force: true });
  }
}
