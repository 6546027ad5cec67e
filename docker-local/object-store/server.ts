import { existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { join } from 'node:path';
import { json } from 'node:stream/consumers';
import { BucketStore } from './bucket-store';
import { handleBucket } from './bucket-routes';
import { StoreError } from './errors';
import { FaultPlan, type Faults } from './faults';
import { handleObject, sendXml } from './object-routes';
import { parseQuery, verifySignature, type Credentials } from './signature';

export interface ObjectStoreOptions {
  folder: string;
  credentials: Credentials;
  /** Buckets made at start if missing. */
  buckets?: string[];
  /** Opens `PUT /_faults` to anybody on this machine: for tests only. */
  allowFaults?: boolean;
}

const BUCKET_NAME = /^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/;

class Buckets {
  private readonly open = new Map<string, BucketStore>();

  constructor(private readonly folder: string) {
    mkdirSync(folder, { recursive: true });
    for (const name of readdirSync(folder)) if (BUCKET_NAME.test(name)) this.create(name);
  }

  create(name: string): void {
    if (!BUCKET_NAME.test(name))
      throw new StoreError('InvalidBucketName', 'The specified bucket is not valid.');
    if (!this.open.has(name)) this.open.set(name, new BucketStore(join(this.folder, name)));
  }

  has(name: string): boolean {
    return this.open.has(name);
  }

  require(name: string): BucketStore {
    const bucket = this.open.get(name);
    if (!bucket) throw new StoreError('NoSuchBucket', 'The specified bucket does not exist');
    return bucket;
  }

  remove(name: string): void {
    if (this.require(name).list('').length > 0)
      throw new StoreError('BucketNotEmpty', 'The bucket is not empty');
    this.open.delete(name);
    if (existsSync(join(this.folder, name))) rmSync(join(this.folder, name), { recursive: true });
  }
}

function refuse(request: IncomingMessage, response: ServerResponse, error: unknown): void {
  const known =
    error instanceof StoreError
      ? error
      : new StoreError('InternalError', 'The store met an unexpected error.');
  if (known !== error && !request.destroyed) console.error(error);
  if (response.headersSent || response.destroyed) return void response.destroy();
  // The rest of a refused body is read and dropped, so that the client gets to see the answer.
  request.resume();
  if (request.method === 'HEAD') return void response.writeHead(known.status).end();
  sendXml(response, known.status, 'Error', {
    Code: known.code,
    Message: known.message,
    Resource: request.url,
  });
}

/** An S3-compatible HTTP server over one folder; the caller listens (on a loopback address) and closes. */
export function createObjectStore({
  folder,
  credentials,
  buckets: wanted = [],
  allowFaults = false,
}: ObjectStoreOptions): Server {
  const buckets = new Buckets(folder);
  for (const name of wanted) buckets.create(name);
  const plan = new FaultPlan();

  async function answer(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const [path = '/', rawQuery = ''] = (request.url ?? '/').split(/\?(.*)/s);
    if (allowFaults && request.method === 'PUT' && path === '/_faults') {
      plan.set((await json(request)) as Faults);
      return void response.writeHead(204).end();
    }
    const signature = await verifySignature(request, credentials);
    const faults = await plan.apply(request.method ?? '');
    const [, bucketName = '', rawKey = ''] = /^\/([^/]*)\/?(.*)$/s.exec(path) ?? [];
    const key = decodeURIComponent(rawKey);
    const query = Object.fromEntries(
      Object.entries(parseQuery(rawQuery)).map(([name, value]) => [name, String(value)]),
    );
    const call = { request, response, signature, query, faults };
    if (bucketName === '') throw new StoreError('NotImplemented', 'Listing buckets is not known here.');
    if (key !== '') return handleObject(call, buckets.require(bucketName), bucketName, key);
    if (request.method === 'PUT') {
      if (buckets.has(bucketName))
        throw new StoreError('BucketAlreadyOwnedByYou', 'The bucket exists already.');
      buckets.create(bucketName);
      return void response.writeHead(200, { Location: `/${bucketName}`, 'Content-Length': 0 }).end();
    }
    if (request.method === 'DELETE') {
      buckets.remove(bucketName);
      return void response.writeHead(204).end();
    }
    return handleBucket(call, buckets.require(bucketName), bucketName);
  }

  const server = createServer((request, response) => {
    response.setHeader('Server', 'heartcut-object-store');
    answer(request, response).catch((error: unknown) => refuse(request, response, error));
  });
  // Long uploads over a slow link are not an attack on a loopback server.
  server.requestTimeout = 0;
  return server;
}
