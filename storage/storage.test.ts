import { createHash, randomBytes } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { PutObjectCommand } from '@aws-sdk/client-s3';
import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest';
import { TestStore } from '@/docker-local/object-store/test-store';
import { connectObjectStore, StorageError, type ObjectStore } from './client';
import { isObjectStoreHealthy } from './health';
import { objectKeyFor } from './keys';
import { putObject, putSpooledFile } from './put-object';
import { findObjectByteLength, openObject, openObjectRange, readObject, verifyObject } from './read-object';
import { spoolFile, TooLargeError } from './spool-file';

const fake = new TestStore();
const folder = mkdtempSync(join(tmpdir(), 'heartcut-spool-test-'));
let store: ObjectStore;

beforeAll(async () => {
  await fake.start();
  store = connectObjectStore(fake.config);
}, 30_000);
beforeEach(() => fake.setFaults({}));
afterAll(async () => {
  await fake.dispose();
  rmSync(folder, { recursive: true, force: true });
});

const options = { contentType: 'application/octet-stream', folder };
const hexOf = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');
const streamOf = (bytes: Buffer) => Readable.from([bytes.subarray(0, 1000), bytes.subarray(1000)]);
const putNew = async (byteLength = 100_000) => {
  const bytes = randomBytes(byteLength);
  return { bytes, stored: await putObject(streamOf(bytes), options, store) };
};

it('stores a stream under its digest, readable by an independent client, and leaves no temporary file', async () => {
  const { bytes, stored } = await putNew();
  const key = objectKeyFor(hexOf(bytes));
  expect(stored).toEqual({ key, sha256Hex: hexOf(bytes), byteLength: 100_000, alreadyThere: false });
  expect((await buffer(await fake.minio().getObject(fake.bucket, key))).equals(bytes)).toBe(true);
  expect(await findObjectByteLength(key, store)).toBe(100_000);
  expect(readdirSync(folder)).toEqual([]);
});

it('takes an empty file', async () => {
  const stored = await putObject(Readable.from([]), options, store);
  expect(stored.sha256Hex).toBe(hexOf(Buffer.alloc(0)));
  expect(await readObject(stored.key, { maxBytes: 10 }, store)).toHaveLength(0);
});

it('treats the same bytes sent by five at once as one object', async () => {
  const bytes = randomBytes(50_000);
  const results = await Promise.all(
    Array.from({ length: 5 }, () => putObject(streamOf(bytes), options, store)),
  );
  expect(new Set(results.map((result) => result.key)).size).toBe(1);
  expect(results.filter((result) => !result.alreadyThere)).toHaveLength(1);
});

it('refuses what is too large and what breaks off, and leaves nothing in the store', async () => {
  const bytes = randomBytes(5_000);
  await expect(putObject(streamOf(bytes), { ...options, maxBytes: 4_999 }, store)).rejects.toThrow(
    TooLargeError,
  );
  async function* broken() {
    yield bytes;
    throw new Error('the sender went away');
  }
  await expect(putObject(broken(), options, store)).rejects.toThrow('the sender went away');
  expect(await findObjectByteLength(objectKeyFor(hexOf(bytes)), store)).toBeNull();
  expect(readdirSync(folder)).toEqual([]);
});

it('is refused by the store when the spooled bytes are not those that were hashed', async () => {
  const file = await spoolFile(streamOf(randomBytes(5_000)), { folder });
  const changed = { ...file, openStream: () => Readable.from([randomBytes(5_000)]) };
  await expect(putSpooledFile(changed, options.contentType, store)).rejects.toThrow(StorageError);
  expect(await findObjectByteLength(objectKeyFor(file.sha256Hex), store)).toBeNull();
  await file.discard();
});

it('sends a put again after a failure of the store', async () => {
  await fake.setFaults({ method: 'PUT', failNth: 1 });
  const { bytes, stored } = await putNew();
  expect((await readObject(stored.key, { maxBytes: 1e6 }, store)).equals(bytes)).toBe(true);
});

it('reads whole objects and ranges', async () => {
  const { bytes, stored } = await putNew(300_000);
  expect((await buffer(await openObject(stored.key, store))).equals(bytes)).toBe(true);
  const range = await buffer(await openObjectRange(stored.key, { first: 10, last: 19 }, store));
  expect(range.equals(bytes.subarray(10, 20))).toBe(true);
  await expect(readObject(stored.key, { maxBytes: 299_999 }, store)).rejects.toThrow('larger than');
});

it('fails loudly when one byte comes back changed or the object breaks off', async () => {
  const { stored } = await putNew(300_000);
  await fake.setFaults({ method: 'GET', flipByteAt: 299_999 });
  await expect(buffer(await openObject(stored.key, store))).rejects.toThrow('damaged');
  expect(await verifyObject(stored.key, store)).toBe('damaged');
  await fake.setFaults({ method: 'GET', truncateAfterBytes: 1_000 });
  await expect(buffer(await openObject(stored.key, store))).rejects.toThrow(StorageError);
  await fake.setFaults({});
  expect(await verifyObject(stored.key, store)).toBe('intact');
});

it('tells a missing object and a foreign one from an intact one', async () => {
  const key = objectKeyFor('0'.repeat(64));
  expect(await verifyObject(key, store)).toBe('missing');
  await expect(openObject(key, store)).rejects.toThrow('missing');
  await store.client.send(
    new PutObjectCommand({ Bucket: store.bucket, Key: key, Body: 'not what the key says' }),
  );
  expect(await verifyObject(key, store)).toBe('damaged');
  await expect(
    putSpooledFile(
      { sha256Hex: '0'.repeat(64), byteLength: 5, openStream: () => Readable.from(['five!']) } as never,
      'text/plain',
      store,
    ),
  ).rejects.toThrow('restore it from backup');
});

it('knows whether the store answers', async () => {
  expect(await isObjectStoreHealthy(2_000, store)).toBe(true);
  const wrongSecret = connectObjectStore({ ...fake.config, secretKey: 'guessed' });
  expect(await isObjectStoreHealthy(2_000, wrongSecret)).toBe(false);
  const nobody = connectObjectStore({ ...fake.config, endpoint: 'http://127.0.0.1:1' });
  expect(await isObjectStoreHealthy(2_000, nobody)).toBe(false);
});

it('keeps memory flat for 128 MB', async () => {
  const piece = randomBytes(1024 * 1024);
  async function* pieces() {
    for (let index = 0; index < 128; index += 1) yield piece;
  }
  await putNew(1_000_000);
  const before = process.memoryUsage().rss;
  let peak = before;
  const timer = setInterval(() => (peak = Math.max(peak, process.memoryUsage().rss)), 10);
  const stored = await putObject(pieces(), options, store);
  clearInterval(timer);
  expect(stored.byteLength).toBe(128 * 1024 * 1024);
  expect((peak - before) / 1024 / 1024).toBeLessThan(64);
}, 60_000);
