import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { S3Client } from '@aws-sdk/client-s3';
import { Client as MinioClient } from 'minio';

const CREDENTIALS = { accessKeyId: 'test-access', secretAccessKey: 'test-secret-of-the-store' };

/** A store in a process of its own, so that tests can kill it; state in a temporary folder. */
export class TestStore {
  readonly folder = mkdtempSync(join(tmpdir(), 'heartcut-store-'));
  readonly bucket = 'evidence';
  private child: ChildProcess | null = null;
  port = 0;

  async start(): Promise<void> {
    const ready = join(this.folder, 'ready.json');
    rmSync(ready, { force: true });
    const child = spawn(
      process.execPath,
      ['--import', 'tsx', fileURLToPath(new URL('main.ts', import.meta.url))],
      {
        stdio: ['ignore', 'inherit', 'inherit'],
        env: {
          ...process.env,
          OBJECT_STORE_FOLDER: join(this.folder, 'buckets'),
          OBJECT_STORE_ACCESS_KEY: CREDENTIALS.accessKeyId,
          OBJECT_STORE_SECRET_KEY: CREDENTIALS.secretAccessKey,
          OBJECT_STORE_BUCKET: this.bucket,
          OBJECT_STORE_ALLOW_FAULTS: '1',
          OBJECT_STORE_PORT: String(this.port),
          HEARTCUT_READY_FILE: ready,
        },
      },
    );
    this.child = child;
    for (let waitedMs = 0; waitedMs < 15_000; waitedMs += 25) {
      await new Promise((resolve) => setTimeout(resolve, 25));
      if (child.exitCode !== null) throw new Error(`The store ended with code ${child.exitCode}.`);
      try {
        this.port = (JSON.parse(readFileSync(ready, 'utf8')) as { port: number }).port;
        return;
      } catch {
        // Not ready yet.
      }
    }
    throw new Error('The store did not become ready.');
  }

  async stop(signal: NodeJS.Signals = 'SIGTERM'): Promise<void> {
    const { child } = this;
    this.child = null;
    if (!child || child.exitCode !== null || child.signalCode !== null) return;
    const ended = once(child, 'exit');
    child.kill(signal);
    await ended;
  }

  async dispose(): Promise<void> {
    await this.stop();
    rmSync(this.folder, { recursive: true, force: true });
  }

  get endpoint(): string {
    return `http://127.0.0.1:${this.port}`;
  }

  get config() {
    const { accessKeyId: accessKey, secretAccessKey: secretKey } = CREDENTIALS;
    return { endpoint: this.endpoint, region: 'us-east-1', bucket: this.bucket, accessKey, secretKey };
  }

  aws(overrides: ConstructorParameters<typeof S3Client>[0] = {}): S3Client {
    return new S3Client({
      endpoint: this.endpoint,
      region: 'us-east-1',
      credentials: CREDENTIALS,
      forcePathStyle: true,
      maxAttempts: 1,
      ...overrides,
    });
  }

  minio(secretKey = CREDENTIALS.secretAccessKey): MinioClient {
    const place = { endPoint: '127.0.0.1', port: this.port, useSSL: false, region: 'us-east-1' };
    return new MinioClient({ ...place, accessKey: CREDENTIALS.accessKeyId, secretKey });
  }

  async setFaults(faults: object): Promise<void> {
    await fetch(`${this.endpoint}/_faults`, { method: 'PUT', body: JSON.stringify(faults) });
  }
}
