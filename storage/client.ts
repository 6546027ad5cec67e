import { S3Client } from '@aws-sdk/client-s3';
import { env } from '@/lib/env';

export interface ObjectStoreConfig {
  endpoint: string;
  region: string;
  bucket: string;
  accessKey: string;
  secretKey: string;
}

/** A connection to one bucket; every function of this folder takes one and defaults to the configured one. */
export interface ObjectStore {
  client: S3Client;
  bucket: string;
}

/** A store could not do what was asked, or gave back other bytes than were stored. */
export class StorageError extends Error {
  constructor(
    message: string,
    readonly key: string,
    options?: { cause?: unknown },
  ) {
    super(message, options);
    this.name = 'StorageError';
  }
}

// The client would print to the console that it cannot repeat a streamed put; put-object.ts repeats it itself.
const ignore = () => undefined;
const silentLogger = { trace: ignore, debug: ignore, info: ignore, warn: ignore, error: ignore };

/** Connects to any S3-compatible store by path-style addresses. Nothing is sent until the first call. */
export function connectObjectStore(config: ObjectStoreConfig): ObjectStore {
  const client = new S3Client({
    endpoint: config.endpoint,
    region: config.region,
    credentials: { accessKeyId: config.accessKey, secretAccessKey: config.secretKey },
    forcePathStyle: true,
    logger: silentLogger,
    // Otherwise presigned PUT addresses carry the checksum of an empty body. Puts send their SHA-256 themselves.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    // Whole reads are checked against the key's own digest in read-object.ts.
    responseChecksumValidation: 'WHEN_REQUIRED',
    // A silent store must not hold a request for ever; bodies may take as long as they make progress.
    requestHandler: { connectionTimeout: 5_000, requestTimeout: 60_000, httpAgent: { maxSockets: 64 } },
  });
  return { client, bucket: config.bucket };
}

// Kept on globalThis: a development server loads this module anew on each change.
const holder = globalThis as { heartcutObjectStore?: { of: string; store: ObjectStore } };

/** The store named in the environment, connected once. */
export function objectStore(): ObjectStore {
  const config = env().s3;
  const of = JSON.stringify(config);
  if (holder.heartcutObjectStore?.of !== of) {
    holder.heartcutObjectStore?.store.client.destroy();
    holder.heartcutObjectStore = { of, store: connectObjectStore(config) };
  }
  return holder.heartcutObjectStore.store;
}

/** The HTTP status of a refusal by the store, or undefined for a network failure. */
export function statusOf(error: unknown): number | undefined {
  const metadata = (error as { $metadata?: { httpStatusCode?: number } } | null)?.$metadata;
  return metadata?.httpStatusCode;
}
