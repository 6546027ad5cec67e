import { createHash, randomBytes } from 'node:crypto';
import { readdirSync } from 'node:fs';
import { connect } from 'node:net';
import { join } from 'node:path';
import { PassThrough, Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import {
  CompleteMultipartUploadCommand,
  CreateBucketCommand,
  CreateMultipartUploadCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  UploadPartCommand,
  type S3Client,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { TestStore } from './test-store';

const store = new TestStore();
const Bucket = store.bucket;
let aws: S3Client;

beforeAll(async () => {
  await store.start();
  aws = store.aws();
}, 30_000);
afterAll(() => store.dispose());

const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('base64');
const put = (Key: string, Body: Buffer | string, more = {}) =>
  aws.send(new PutObjectCommand({ Bucket, Key, Body, ...more }));
const get = async (Key: string, client = aws) => {
  const answer = await client.send(new GetObjectCommand({ Bucket, Key }));
  return Buffer.from(await answer.Body!.transformToByteArray());
};
const refusal = async (promise: Promise<unknown>) => {
  const error = await promise.then(
    () => null,
    (reason: unknown) => reason as { name: string; code?: string; $metadata?: { httpStatusCode?: number } },
  );
  if (!error) throw new Error('The call was not refused.');
  return { code: error.code ?? error.name, status: error.$metadata?.httpStatusCode };
};

describe('who may call', () => {
  it('refuses a wrong secret from either client', async () => {
    const stranger = store.aws({ credentials: { accessKeyId: 'test-access', secretAccessKey: 'guessed' } });
    const answer = await refusal(stranger.send(new PutObjectCommand({ Bucket, Key: 'stranger', Body: 'x' })));
    expect(answer).toEqual({ code: 'SignatureDoesNotMatch', status: 403 });
    expect((await refusal(store.minio('guessed').putObject(Bucket, 'stranger', 'x'))).code).toBe(
      'SignatureDoesNotMatch',
    );
    expect((await refusal(aws.send(new HeadObjectCommand({ Bucket, Key: 'stranger' })))).status).toBe(404);
  });

  it('refuses an unknown access key and an unsigned request', async () => {
    const unknown = store.aws({ credentials: { accessKeyId: 'nobody', secretAccessKey: 'guessed' } });
    expect((await refusal(unknown.send(new HeadBucketCommand({ Bucket })))).status).toBe(403);
    await put('secret.txt', 'for members');
    const read = await fetch(`${store.endpoint}/${Bucket}/secret.txt`);
    expect(read.status).toBe(403);
    expect(await read.text()).toContain('<Code>AccessDenied</Code>');
    expect((await fetch(`${store.endpoint}/${Bucket}/secret.txt`, { method: 'PUT', body: 'x' })).status).toBe(
      403,
    );
  });

  it('refuses a request dated an hour ago', async () => {
    const late = store.aws({ systemClockOffset: -3_600_000 });
    expect((await refusal(late.send(new HeadBucketCommand({ Bucket })))).status).toBe(403);
  });

  it('honours presigned addresses until they are changed or expire', async () => {
    await put('shared.txt', 'shared bytes');
    const url = await getSignedUrl(aws, new GetObjectCommand({ Bucket, Key: 'shared.txt' }), {
      expiresIn: 60,
    });
    expect(await (await fetch(url)).text()).toBe('shared bytes');
    expect((await fetch(url.replace('shared.txt', 'secret.txt'))).status).toBe(403);
    expect((await fetch(url.replace('X-Amz-Expires=60', 'X-Amz-Expires=6000'))).status).toBe(403);
    const signingDate = new Date(Date.now() - 120_000);
    const old = await getSignedUrl(aws, new GetObjectCommand({ Bucket, Key: 'shared.txt' }), {
      expiresIn: 60,
      signingDate,
    });
    expect((await fetch(old)).status).toBe(403);
    expect(await (await fetch(await store.minio().presignedGetObject(Bucket, 'shared.txt', 60))).text()).toBe(
      'shared bytes',
    );
  });

  it('takes a presigned PUT from either client', async () => {
    const plain = store.aws({ requestChecksumCalculation: 'WHEN_REQUIRED' });
    const url = await getSignedUrl(plain, new PutObjectCommand({ Bucket, Key: 'put by address' }), {
      expiresIn: 60,
    });
    expect((await fetch(url, { method: 'PUT', body: 'by address' })).status).toBe(200);
    expect((await get('put by address')).toString()).toBe('by address');
    const minioUrl = await store.minio().presignedPutObject(Bucket, 'put/minio', 60);
    expect((await fetch(minioUrl, { method: 'PUT', body: 'by minio' })).status).toBe(200);
    expect((await get('put/minio')).toString()).toBe('by minio');
  });
});

describe('what is stored', () => {
  it('gives back the same bytes through both clients, whichever wrote them', async () => {
    const bytes = randomBytes(300_000);
    await put('a/ü b+c&d=é.bin', bytes, { ContentType: 'text/csv', Metadata: { fraction: 'f3' } });
    expect((await get('a/ü b+c&d=é.bin')).equals(bytes)).toBe(true);
    expect((await buffer(await store.minio().getObject(Bucket, 'a/ü b+c&d=é.bin'))).equals(bytes)).toBe(true);
    const head = await aws.send(new HeadObjectCommand({ Bucket, Key: 'a/ü b+c&d=é.bin' }));
    expect(head).toMatchObject({
      ContentLength: 300_000,
      ContentType: 'text/csv',
      Metadata: { fraction: 'f3' },
    });
    await store.minio().putObject(Bucket, 'from-minio', bytes);
    expect((await get('from-minio')).equals(bytes)).toBe(true);
    await put('empty', '');
    expect(await get('empty')).toHaveLength(0);
  });

  it('takes a stream with its checksum in the trailer', async () => {
    const bytes = randomBytes(700_000);
    const Body = Readable.from([bytes.subarray(0, 100_000), bytes.subarray(100_000)]);
    await aws.send(
      new PutObjectCommand({
        Bucket,
        Key: 'streamed',
        Body,
        ContentLength: bytes.length,
        ChecksumAlgorithm: 'SHA256',
      }),
    );
    expect((await get('streamed')).equals(bytes)).toBe(true);
  });

  it.each([
    ['x-amz-checksum-sha256', { ChecksumSHA256: sha256(Buffer.from('other bytes')) }],
    ['x-amz-checksum-crc32', { ChecksumCRC32: 'AAAAAA==' }],
    ['Content-MD5', { ContentMD5: createHash('md5').update('other bytes').digest('base64') }],
  ])('refuses a wrong %s and stores nothing', async (_name, checksum) => {
    expect(await refusal(put('wrong', 'these bytes', checksum))).toEqual({ code: 'BadDigest', status: 400 });
    expect((await refusal(aws.send(new HeadObjectCommand({ Bucket, Key: 'wrong' })))).status).toBe(404);
  });

  it('accepts a right SHA-256 and answers with it', async () => {
    const bytes = Buffer.from('these bytes');
    await put('right', bytes, { ChecksumSHA256: sha256(bytes) });
    const head = await aws.send(new HeadObjectCommand({ Bucket, Key: 'right', ChecksumMode: 'ENABLED' }));
    expect(head.ChecksumSHA256).toBe(sha256(bytes));
  });

  it('writes once under If-None-Match: *, also when twenty try at the same moment', async () => {
    const tries = Array.from({ length: 20 }, (_, index) =>
      put('once', `writer ${index}`, { IfNoneMatch: '*' }),
    );
    const results = await Promise.allSettled(tries);
    const winners = results.flatMap((result, index) => (result.status === 'fulfilled' ? [index] : []));
    expect(winners).toHaveLength(1);
    expect((await get('once')).toString()).toBe(`writer ${winners[0]}`);
    expect(await refusal(put('once', 'late', { IfNoneMatch: '*' }))).toEqual({
      code: 'PreconditionFailed',
      status: 412,
    });
  });

  it('answers ranges from the start, the middle and the end, and 416 beyond', async () => {
    await put('range', '0123456789');
    const range = async (Range: string) => {
      const answer = await aws.send(new GetObjectCommand({ Bucket, Key: 'range', Range }));
      return [await answer.Body!.transformToString(), answer.ContentRange];
    };
    expect(await range('bytes=2-4')).toEqual(['234', 'bytes 2-4/10']);
    expect(await range('bytes=7-')).toEqual(['789', 'bytes 7-9/10']);
    expect(await range('bytes=-3')).toEqual(['789', 'bytes 7-9/10']);
    expect(await refusal(range('bytes=10-12'))).toEqual({ code: 'InvalidRange', status: 416 });
    expect((await buffer(await store.minio().getPartialObject(Bucket, 'range', 2, 3))).toString()).toBe(
      '234',
    );
  });

  it('lists by prefix and delimiter, page by page', async () => {
    for (const key of ['list/a', 'list/b/1', 'list/b/2', 'list/c']) await put(key, key);
    const list = (more: object) => aws.send(new ListObjectsV2Command({ Bucket, Prefix: 'list/', ...more }));
    const first = await list({ MaxKeys: 3 });
    expect(first.Contents?.map((entry) => entry.Key)).toEqual(['list/a', 'list/b/1', 'list/b/2']);
    const second = await list({ ContinuationToken: first.NextContinuationToken });
    expect(second.Contents?.map((entry) => entry.Key)).toEqual(['list/c']);
    const folders = await list({ Delimiter: '/' });
    expect(folders.CommonPrefixes).toEqual([{ Prefix: 'list/b/' }]);
    expect(folders.Contents?.map((entry) => entry.Key)).toEqual(['list/a', 'list/c']);
  });

  it('deletes, and makes buckets', async () => {
    await put('gone', 'x');
    await aws.send(new DeleteObjectCommand({ Bucket, Key: 'gone' }));
    expect((await refusal(get('gone'))).code).toBe('NoSuchKey');
    await aws.send(new CreateBucketCommand({ Bucket: 'second-bucket' }));
    expect(await store.minio().bucketExists('second-bucket')).toBe(true);
    expect(await store.minio().bucketExists('third-bucket')).toBe(false);
  });

  it('puts parts together from either client', async () => {
    const bytes = randomBytes(6 * 1024 * 1024);
    const { UploadId } = await aws.send(new CreateMultipartUploadCommand({ Bucket, Key: 'parts' }));
    const Parts = [];
    for (const [index, Body] of [
      bytes.subarray(0, 5 * 1024 * 1024),
      bytes.subarray(5 * 1024 * 1024),
    ].entries()) {
      const part = { Bucket, Key: 'parts', UploadId, PartNumber: index + 1 };
      Parts.push({
        PartNumber: index + 1,
        ETag: (await aws.send(new UploadPartCommand({ ...part, Body }))).ETag,
      });
    }
    expect((await refusal(get('parts'))).code).toBe('NoSuchKey');
    await aws.send(
      new CompleteMultipartUploadCommand({ Bucket, Key: 'parts', UploadId, MultipartUpload: { Parts } }),
    );
    expect((await get('parts')).equals(bytes)).toBe(true);
    const minio = store.minio();
    const stream = new PassThrough();
    stream.end(bytes);
    await minio.putObject(Bucket, 'minio-parts', stream);
    expect((await get('minio-parts')).equals(bytes)).toBe(true);
  }, 30_000);
});

describe('what survives', () => {
  it('keeps objects over a restart and a kill, and shows nothing of a put that was cut off', async () => {
    const bytes = randomBytes(200_000);
    await put('lasting', bytes);
    await store.stop();
    await store.start();
    expect((await get('lasting')).equals(bytes)).toBe(true);

    const url = new URL(
      await getSignedUrl(
        store.aws({ requestChecksumCalculation: 'WHEN_REQUIRED' }),
        new PutObjectCommand({ Bucket, Key: 'torn' }),
      ),
    );
    const socket = connect(store.port, '127.0.0.1').on('error', () => undefined);
    socket.write(
      `PUT ${url.pathname}${url.search} HTTP/1.1\r\nHost: ${url.host}\r\nContent-Length: 1000000\r\n\r\n`,
    );
    socket.write(Buffer.alloc(400_000, 7));
    const temporary = join(store.folder, 'buckets', Bucket, 'temporary');
    await expect.poll(() => readdirSync(temporary).length).toBe(1);
    await store.stop('SIGKILL');
    socket.destroy();
    expect(readdirSync(temporary)).toHaveLength(1);
    await store.start();
    expect((await refusal(get('torn'))).code).toBe('NoSuchKey');
    expect(readdirSync(temporary)).toHaveLength(0);
    expect((await get('lasting')).equals(bytes)).toBe(true);
  }, 30_000);

  it('fails, flips and truncates when a test asks for it', async () => {
    await put('faulty', '0123456789');
    await store.setFaults({ method: 'GET', failNth: 2 });
    expect((await get('faulty')).toString()).toBe('0123456789');
    expect((await refusal(get('faulty'))).status).toBe(500);
    const plain = store.aws({ responseChecksumValidation: 'WHEN_REQUIRED' });
    await store.setFaults({ method: 'GET', flipByteAt: 3 });
    expect((await get('faulty', plain))[3]).toBe('3'.charCodeAt(0) ^ 0xff);
    await store.setFaults({ method: 'GET', truncateAfterBytes: 4 });
    await expect(get('faulty', plain)).rejects.toThrow();
    await store.setFaults({});
    expect((await get('faulty')).toString()).toBe('0123456789');
  });
});
