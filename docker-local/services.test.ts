import { chmodSync, mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import mariadb from 'mariadb';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isObjectStoreHealthy } from '@/storage/health';
import { connectObjectStore } from '@/storage/client';
import { buildEnvironment } from './environment.mjs';
import { createDatabase, dropDatabase } from './mariadb/accounts.mjs';
import { isAlive } from './processes.mjs';
import { readSecrets } from './secrets.mjs';
import { ensureServices, releaseServices, stopServices } from './services.mjs';

const home = mkdtempSync(join(tmpdir(), 'heartcut-home-'));
// MariaDB runs as an account of its own when the tests run as root.
chmodSync(home, 0o755);
const options = { home, environment: {}, say: () => undefined };
let facts: Awaited<ReturnType<typeof ensureServices>>;
let env: Record<string, string | undefined>;

beforeAll(async () => {
  facts = await ensureServices({ ...options, hold: true });
  env = buildEnvironment(facts, { port: 3000, base: {} });
}, 120_000);
afterAll(async () => {
  await releaseServices(home);
  rmSync(home, { recursive: true, force: true });
}, 60_000);

const connect = (user: string, password: string, database?: string) =>
  mariadb.createConnection({ host: '127.0.0.1', port: facts.mariadb!.port, user, password, database });

describe('the local services', () => {
  it('are found again by a second call, not started twice', async () => {
    const again = await ensureServices({ ...options, hold: true });
    expect(again).toEqual(facts);
  });

  it('answer: mail, object store and database', async () => {
    expect(await (await fetch(`http://127.0.0.1:${facts.mail!.inboxPort}/messages.json`)).json()).toEqual([]);
    const store = { endpoint: env.S3_ENDPOINT!, region: env.S3_REGION!, bucket: env.S3_BUCKET! };
    const keys = { accessKey: env.S3_ACCESS_KEY!, secretKey: env.S3_SECRET_KEY! };
    expect(await isObjectStoreHealthy(2_000, connectObjectStore({ ...store, ...keys }))).toBe(true);
    const connection = await connect(env.DATABASE_USER!, env.DATABASE_PASSWORD!);
    expect(await connection.query('SELECT @@innodb_flush_log_at_trx_commit AS flush')).toEqual([
      { flush: 1n },
    ]);
    await connection.end();
  });

  it('keep their secrets to their owner', () => {
    expect(statSync(join(home, 'secrets.json')).mode & 0o777).toBe(0o600);
    expect(statSync(join(home, 'objects')).mode & 0o077).toBe(0);
    expect(statSync(join(home, 'mail')).mode & 0o077).toBe(0);
  });

  it('give the application no right that migrations did not grant, and nobody the root account by port', async () => {
    const secrets = readSecrets(home);
    const access = { socket: facts.mariadb!.socket!, password: secrets.databaseRootPassword };
    await createDatabase(access, 'heartcut_test_rights');
    const owner = await connect(
      env.DATABASE_MIGRATE_USER!,
      env.DATABASE_MIGRATE_PASSWORD!,
      'heartcut_test_rights',
    );
    await owner.query('CREATE TABLE events (id INT PRIMARY KEY)');
    await expect(connect(env.DATABASE_USER!, env.DATABASE_PASSWORD!, 'heartcut_test_rights')).rejects.toThrow(
      /denied/i,
    );
    await owner.query("GRANT SELECT, INSERT ON heartcut_test_rights.events TO 'heartcut_app'@'%'");
    const app = await connect(env.DATABASE_USER!, env.DATABASE_PASSWORD!, 'heartcut_test_rights');
    await app.query('INSERT INTO events VALUES (1)');
    await expect(app.query('DELETE FROM events')).rejects.toThrow(/denied/i);
    await expect(app.query('UPDATE events SET id = 2')).rejects.toThrow(/denied/i);
    await app.end();
    await owner.end();
    await dropDatabase(access, 'heartcut_test_rights');
    await expect(
      connect(env.DATABASE_USER!, env.DATABASE_PASSWORD!, 'heartcut_test_rights'),
    ).rejects.toThrow();
    await expect(connect('root', secrets.databaseRootPassword)).rejects.toThrow(/denied/i);
  });

  it('come back after a kill -9 of each, on the same ports', async () => {
    for (const state of [facts.mariadb, facts.s3, facts.mail]) process.kill(state!.pid, 'SIGKILL');
    await expect
      .poll(() => [facts.mariadb, facts.s3, facts.mail].some(isAlive), { timeout: 5_000 })
      .toBe(false);
    const again = await ensureServices({ ...options, hold: true });
    const ports = (of: typeof facts) => [of.mariadb!.port, of.s3!.port, of.mail!.port, of.mail!.inboxPort];
    expect(ports(again)).toEqual(ports(facts));
    facts = again;
    const connection = await connect(env.DATABASE_USER!, env.DATABASE_PASSWORD!);
    await connection.end();
  }, 60_000);

  it('refuse to be stopped under a running app, and stay up after it when services:up was used', async () => {
    await ensureServices({ ...options, keep: true });
    await expect(stopServices(home)).rejects.toThrow(`Process ${process.pid} uses the services`);
    await ensureServices({ ...options, keep: true });
    await releaseServices(home);
    expect(isAlive(facts.mariadb)).toBe(true);
    await stopServices(home);
    expect([facts.mariadb, facts.s3, facts.mail].some(isAlive)).toBe(false);
  }, 60_000);
});

describe('the environment', () => {
  it('leaves to the user what the user has set, and starts nothing for it', () => {
    const elsewhere = { home, mariadb: null, s3: null, mail: facts.mail };
    const base = {
      DATABASE_HOST: 'db.example',
      S3_ENDPOINT: 'https://s3.example',
      S3_BUCKET: 'ours',
      MAIL_FROM: 'Lab <lab@example.org>',
    };
    const built = buildEnvironment(elsewhere, { port: 3001, base });
    expect(built).toMatchObject({
      ...base,
      PORT: '3001',
      NEXTAUTH_URL: 'http://127.0.0.1:3001',
      HEARTCUT_HOME: home,
    });
    expect(built.DATABASE_USER).toBeUndefined();
    expect(built.SMTP_URL).toBe(`smtp://127.0.0.1:${facts.mail!.port}`);
  });
});
