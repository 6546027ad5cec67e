import { createHash, randomUUID } from 'node:crypto';
import { DeleteObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { objectStore } from '@/storage/client';
import { objectKeyFor } from '@/storage/keys';
import type { BenchRow } from '../bench-row';
import { compare, msText } from '../measure';
import { peakResidentBytes, residentBytes } from '../resident-memory';
import { sendBytes } from '../send-bytes';
import { buildTraceBytes } from '../trace-bytes';

const megabyte = 1_000_000;
const fileBytes = 100 * megabyte;
const repetitions = 5;

const remove = (Key: string) => {
  const { client, bucket } = objectStore();
  return client.send(new DeleteObjectCommand({ Bucket: bucket, Key }));
};

/** Milliseconds of a presigned PUT, which hashes nothing, and of the SHA-256 of the same bytes after it. */
async function putBare(bytes: Buffer): Promise<number> {
  const { client, bucket } = objectStore();
  const Key = `bench/${randomUUID()}`;
  const url = await getSignedUrl(client, new PutObjectCommand({ Bucket: bucket, Key }), { expiresIn: 300 });
  const started = performance.now();
  await sendBytes(url, bytes, { method: 'PUT' });
  createHash('sha256').update(bytes).digest();
  const tookMs = performance.now() - started;
  await remove(Key);
  return tookMs;
}

/** Milliseconds of the same through the app, sent as an instrument sends it. */
async function uploadTo(url: string, token: string, bytes: Buffer): Promise<number> {
  const headers = {
    authorization: `Bearer ${token}`,
    'content-type': 'application/octet-stream',
    'x-filename': 'bench-trace.csv',
  };
  const started = performance.now();
  await sendBytes(url, bytes, { method: 'POST', headers });
  const tookMs = performance.now() - started;
  await remove(objectKeyFor(createHash('sha256').update(bytes).digest('hex')));
  return tookMs;
}

export const row: BenchRow = {
  name: 'upload',
  async measure(bench) {
    const app = await bench.app();
    const { token, fraction } = await bench.laboratory();
    // As a document it is kept and not read: what is measured is the way of the bytes.
    const url = `${app.url}/api/v1/evidence?kind=document&fraction=${fraction.code}`;
    await uploadTo(url, token, buildTraceBytes(megabyte));
    const before = await residentBytes(app.pid);
    let peak = before;
    // Both of a turn get the same bytes; the next turn gets others.
    let bytes: Buffer = Buffer.alloc(0);
    let taken = 0;
    const nextBytes = () => (taken++ % 2 === 0 ? (bytes = buildTraceBytes(fileBytes)) : bytes);
    const result = await compare(
      async () => {
        const given = nextBytes();
        let tookMs = 0;
        const seen = await peakResidentBytes(
          app.pid,
          async () => (tookMs = await uploadTo(url, token, given)),
        );
        peak = Math.max(peak, seen);
        return tookMs;
      },
      () => putBare(nextBytes()),
      { repetitions },
    );
    const grownMb = (peak - before) / megabyte;
    return [
      {
        what: 'upload of 100 MB ÷ raw PUT + SHA-256',
        measured: msText(result.measured),
        baseline: msText(result.baseline),
        ratio: result.ratio,
        spread: result.spread,
        note: `The store is the local one; ${result.repetitions} repetitions in turns, new bytes in each.`,
      },
      {
        what: 'memory of the server: peak growth ÷ file',
        measured: `${grownMb.toFixed(0)} MB`,
        baseline: '100 MB',
        ratio: grownMb / (fileBytes / megabyte),
        goal: 'flat: far under 1',
        note: `Resident memory before the first of the ${result.repetitions + 1} uploads: ${(before / megabyte).toFixed(0)} MB; highest in any: ${(peak / megabyte).toFixed(0)} MB.`,
      },
    ];
  },
};
