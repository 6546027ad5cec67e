import type { IncomingMessage, ServerResponse } from 'node:http';
import { text } from 'node:stream/consumers';
import { receiveBody } from './body';
import type { BucketStore } from './bucket-store';
import { StoreError } from './errors';
import type { Faults } from './faults';
import { MultipartUploads } from './multipart';
import { sendObject } from './send-object';
import type { VerifiedSignature } from './signature';
import { readCompletedParts, xmlDocument } from './xml';

export interface Call {
  request: IncomingMessage;
  response: ServerResponse;
  signature: VerifiedSignature;
  query: Record<string, string>;
  faults: Faults;
}

function describeUpload({ headers }: IncomingMessage) {
  const metadata: Record<string, string> = {};
  for (const [name, value] of Object.entries(headers)) {
    if (name.startsWith('x-amz-meta-')) metadata[name.slice('x-amz-meta-'.length)] = String(value);
  }
  return { contentType: headers['content-type'] ?? 'application/octet-stream', metadata };
}

function readOnlyIfAbsent({ headers }: IncomingMessage): boolean {
  const value = headers['if-none-match'];
  if (value === undefined) return false;
  if (value !== '*') throw new StoreError('NotImplemented', 'Only If-None-Match: * is known for writing.');
  return true;
}

export function sendXml(
  response: ServerResponse,
  status: number,
  root: string,
  values: Parameters<typeof xmlDocument>[1],
) {
  const body = xmlDocument(root, values);
  response.writeHead(status, {
    'Content-Type': 'application/xml',
    'Content-Length': Buffer.byteLength(body),
  });
  response.end(body);
}

async function putBytes({ request, response, signature, query }: Call, bucket: BucketStore, key: string) {
  if (request.headers['x-amz-copy-source'])
    throw new StoreError('NotImplemented', 'Copying is not known here.');
  const onlyIfAbsent = readOnlyIfAbsent(request);
  if (onlyIfAbsent) bucket.requireAbsent(key);
  const { uploadId, partNumber } = query;
  const uploads = new MultipartUploads(bucket);
  if (uploadId !== undefined) {
    await uploads.require(uploadId, key);
    const number = Number(partNumber);
    if (!(Number.isInteger(number) && number >= 1 && number <= 10_000)) {
      throw new StoreError('InvalidArgument', 'Part number must be an integer between 1 and 10000');
    }
  }
  const pending = await bucket.createPending();
  try {
    const { byteLength, md5Hex, checksums } = await receiveBody(request, signature, (bytes) =>
      pending.write(bytes),
    );
    if (uploadId !== undefined) {
      await uploads.addPart(uploadId, { partNumber: Number(partNumber), etag: md5Hex, byteLength }, pending);
    } else {
      const facts = { key, byteLength, etag: md5Hex, checksums, ...describeUpload(request) };
      await bucket.commit(pending, facts, { onlyIfAbsent });
    }
    for (const [name, value] of Object.entries(checksums))
      response.setHeader(`x-amz-checksum-${name}`, value);
    response.writeHead(200, { ETag: `"${md5Hex}"`, 'Content-Length': 0 }).end();
  } catch (error) {
    await pending.discard();
    throw error;
  }
}

async function postObject(
  { request, response, signature, query }: Call,
  bucket: BucketStore,
  bucketName: string,
  key: string,
) {
  const uploads = new MultipartUploads(bucket);
  if ('uploads' in query) {
    const upload = await uploads.begin({ key, ...describeUpload(request) });
    return sendXml(response, 200, 'InitiateMultipartUploadResult', {
      Bucket: bucketName,
      Key: key,
      UploadId: upload.uploadId,
    });
  }
  if (query.uploadId === undefined)
    throw new StoreError('MethodNotAllowed', 'This form of POST is not known here.');
  const upload = await uploads.require(query.uploadId, key);
  const chunks: Buffer[] = [];
  await receiveBody(request, signature, async (bytes) => void chunks.push(bytes));
  const parts = readCompletedParts(Buffer.concat(chunks).toString('utf8'));
  const record = await uploads.complete(upload, parts, { onlyIfAbsent: readOnlyIfAbsent(request) });
  sendXml(response, 200, 'CompleteMultipartUploadResult', {
    Location: `http://${request.headers.host}/${bucketName}/${encodeURIComponent(key)}`,
    Bucket: bucketName,
    Key: key,
    ETag: `"${record.etag}"`,
  });
}

async function getObject(call: Call, bucket: BucketStore, bucketName: string, key: string) {
  const { request, response, query, faults } = call;
  if (query.uploadId !== undefined) {
    await new MultipartUploads(bucket).require(query.uploadId, key);
    const parts = await new MultipartUploads(bucket).listParts(query.uploadId);
    const Part = parts.map((part) => ({
      PartNumber: part.partNumber,
      ETag: `"${part.etag}"`,
      Size: part.byteLength,
    }));
    const facts = { Bucket: bucketName, Key: key, UploadId: query.uploadId, IsTruncated: false, Part };
    return sendXml(response, 200, 'ListPartsResult', facts);
  }
  const overrides: Record<string, string> = {};
  for (const name of ['Content-Type', 'Content-Disposition', 'Cache-Control']) {
    const value = query[`response-${name.toLowerCase()}`];
    if (value !== undefined) overrides[name] = value;
  }
  return sendObject(request, response, bucket, key, overrides, faults);
}

/** Answers a call on one object (path /bucket/key). */
export async function handleObject(
  call: Call,
  bucket: BucketStore,
  bucketName: string,
  key: string,
): Promise<void> {
  switch (call.request.method) {
    case 'GET':
    case 'HEAD':
      return getObject(call, bucket, bucketName, key);
    case 'PUT':
      return putBytes(call, bucket, key);
    case 'POST':
      return postObject(call, bucket, bucketName, key);
    case 'DELETE':
      if (call.query.uploadId !== undefined) {
        await new MultipartUploads(bucket).require(call.query.uploadId, key);
        await new MultipartUploads(bucket).abort(call.query.uploadId);
      } else await bucket.remove(key);
      call.response.writeHead(204).end();
      return;
    default:
      await text(call.request);
      throw new StoreError('MethodNotAllowed', 'The specified method is not allowed against this resource.');
  }
}
