import { createHash, randomUUID } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import { PendingFile, syncFolder } from './disk';
import { StoreError } from './errors';

export interface ObjectRecord {
  key: string;
  /** Name of the file of bytes; a new one for each put, so a reader of the old object is not disturbed. */
  dataName: string;
  byteLength: number;
  etag: string;
  lastModified: string;
  contentType: string;
  metadata: Record<string, string>;
  checksums: Record<string, string>;
}

/**
 * One bucket: `data/` holds bytes, `index/` one small JSON file an object, `temporary/` what is not finished.
 * The rename of the index file is the moment an object exists: before it nothing is visible, after it all is.
 */
export class BucketStore {
  private readonly records = new Map<string, ObjectRecord>();
  private readonly writing = new Map<string, Promise<unknown>>();

  constructor(readonly folder: string) {
    for (const name of ['data', 'index', 'temporary']) mkdirSync(join(folder, name), { recursive: true });
    for (const name of readdirSync(this.path('index'))) {
      const record = JSON.parse(readFileSync(this.path('index', name), 'utf8')) as ObjectRecord;
      this.records.set(record.key, record);
    }
    // What a kill left behind: unfinished files, and bytes whose index entry never came or has moved on.
    const used = new Set([...this.records.values()].map((record) => record.dataName));
    for (const name of readdirSync(this.path('data'))) if (!used.has(name)) rmSync(this.path('data', name));
    for (const name of readdirSync(this.path('temporary')))
      rmSync(this.path('temporary', name), { recursive: true });
  }

  private path(...names: string[]): string {
    return join(this.folder, ...names);
  }

  private indexPath(key: string): string {
    return this.path('index', `${createHash('sha256').update(key).digest('hex')}.json`);
  }

  /** Writes to one key happen one after the other; that makes `If-None-Match` and overwriting exact. */
  private async inTurn<Result>(key: string, action: () => Promise<Result>): Promise<Result> {
    const before = this.writing.get(key) ?? Promise.resolve();
    const mine = before.catch(() => undefined).then(action);
    this.writing.set(key, mine);
    try {
      return await mine;
    } finally {
      if (this.writing.get(key) === mine) this.writing.delete(key);
    }
  }

  createPending(): Promise<PendingFile> {
    return PendingFile.create(this.path('temporary'));
  }

  dataPath(record: ObjectRecord): string {
    return this.path('data', record.dataName);
  }

  find(key: string): ObjectRecord | undefined {
    return this.records.get(key);
  }

  require(key: string): ObjectRecord {
    const record = this.records.get(key);
    if (!record) throw new StoreError('NoSuchKey', 'The specified key does not exist.');
    return record;
  }

  /** All records with the prefix, in UTF-8 order of their keys. */
  list(prefix: string): ObjectRecord[] {
    return [...this.records.values()]
      .filter((record) => record.key.startsWith(prefix))
      .sort((a, b) => Buffer.compare(Buffer.from(a.key), Buffer.from(b.key)));
  }

  requireAbsent(key: string): void {
    if (this.records.has(key)) {
      throw new StoreError(
        'PreconditionFailed',
        'At least one of the pre-conditions you specified did not hold.',
      );
    }
  }

  /** Publishes a finished file of bytes under its key. Throws PreconditionFailed when `onlyIfAbsent` and it exists. */
  async commit(
    pending: PendingFile,
    facts: Omit<ObjectRecord, 'dataName' | 'lastModified'>,
    { onlyIfAbsent }: { onlyIfAbsent: boolean },
  ): Promise<ObjectRecord> {
    return this.inTurn(facts.key, async () => {
      if (onlyIfAbsent) this.requireAbsent(facts.key);
      const record: ObjectRecord = {
        ...facts,
        dataName: randomUUID(),
        lastModified: new Date().toISOString(),
      };
      await pending.publish(this.dataPath(record));
      const index = await this.createPending();
      await index.write(Buffer.from(JSON.stringify(record)));
      await index.publish(this.indexPath(record.key));
      const replaced = this.records.get(record.key);
      this.records.set(record.key, record);
      if (replaced) await rm(this.dataPath(replaced), { force: true });
      return record;
    });
  }

  async remove(key: string): Promise<void> {
    await this.inTurn(key, async () => {
      const record = this.records.get(key);
      if (!record) return;
      await rm(this.indexPath(key), { force: true });
      await syncFolder(this.path('index'));
      this.records.delete(key);
      await rm(this.dataPath(record), { force: true });
    });
  }
}
