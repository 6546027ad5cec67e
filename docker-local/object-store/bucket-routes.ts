import type { BucketStore } from './bucket-store';
import { StoreError } from './errors';
import { MultipartUploads } from './multipart';
import { sendXml, type Call } from './object-routes';

/** ListObjectsV2: prefix, delimiter, max-keys, start-after and continuation (the token is the last key, in base64). */
function listObjects({ query, response }: Call, bucket: BucketStore, bucketName: string): void {
  const { prefix = '', delimiter = '' } = query;
  const token = query['continuation-token'];
  const after =
    token === undefined ? (query['start-after'] ?? '') : Buffer.from(token, 'base64url').toString('utf8');
  const limit = Math.min(Number(query['max-keys'] ?? 1000), 1000);
  if (!(limit >= 0)) throw new StoreError('InvalidArgument', 'max-keys is not a number.');
  const encode = query['encoding-type'] === 'url' ? encodeURIComponent : (text: string) => text;

  const entries = new Map<string, ReturnType<BucketStore['list']>[number] | null>();
  for (const record of bucket.list(prefix)) {
    const cut = delimiter ? record.key.indexOf(delimiter, prefix.length) : -1;
    const name = cut < 0 ? record.key : record.key.slice(0, cut + delimiter.length);
    if (Buffer.compare(Buffer.from(name), Buffer.from(after)) > 0) entries.set(name, cut < 0 ? record : null);
  }
  const page = [...entries].slice(0, limit);
  const more = entries.size > page.length && page.length > 0;
  sendXml(response, 200, 'ListBucketResult', {
    Name: bucketName,
    Prefix: encode(prefix),
    Delimiter: delimiter ? encode(delimiter) : undefined,
    EncodingType: query['encoding-type'],
    MaxKeys: limit,
    KeyCount: page.length,
    IsTruncated: more,
    NextContinuationToken: more ? Buffer.from(page.at(-1)![0]).toString('base64url') : undefined,
    Contents: page.flatMap(([, record]) =>
      record
        ? [
            {
              Key: encode(record.key),
              LastModified: record.lastModified,
              ETag: `"${record.etag}"`,
              Size: record.byteLength,
            },
          ]
        : [],
    ),
    CommonPrefixes: page.flatMap(([name, record]) => (record ? [] : [{ Prefix: encode(name) }])),
  });
}

async function listUploads(
  { query, response }: Call,
  bucket: BucketStore,
  bucketName: string,
): Promise<void> {
  const uploads = await new MultipartUploads(bucket).list(query.prefix ?? '');
  const Upload = uploads.map(({ key, uploadId, initiated }) => ({
    Key: key,
    UploadId: uploadId,
    Initiated: initiated,
  }));
  sendXml(response, 200, 'ListMultipartUploadsResult', { Bucket: bucketName, IsTruncated: false, Upload });
}

/** Answers a GET or HEAD on a bucket that exists. */
export async function handleBucket(call: Call, bucket: BucketStore, bucketName: string): Promise<void> {
  const { request, response, query } = call;
  if (request.method === 'HEAD') return void response.writeHead(200).end();
  if (request.method !== 'GET')
    throw new StoreError('NotImplemented', 'This call on a bucket is not known here.');
  if ('location' in query) return sendXml(response, 200, 'LocationConstraint', {});
  if ('uploads' in query) return listUploads(call, bucket, bucketName);
  if (query['list-type'] !== '2')
    throw new StoreError('NotImplemented', 'Only version 2 of the list call is known here.');
  return listObjects(call, bucket, bucketName);
}
