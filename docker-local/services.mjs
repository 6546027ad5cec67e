import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { addHolder, listHolders, removeHolder } from './holders.mjs';
import { findJson, writeJson } from './json-file.mjs';
import { withLock } from './lock.mjs';
import { prepareAccounts } from './mariadb/accounts.mjs';
import { startMariadb } from './mariadb/server.mjs';
import { ROOT } from './places.mjs';
import { identify, isAlive, stopProcess } from './processes.mjs';
import { readSecrets } from './secrets.mjs';
import { requireMariadb } from './system-packages.mjs';

export const BUCKET = 'heartcut';

/**
 * @typedef {{ pid: number, startToken: string, port?: number, socket?: string, inboxPort?: number }} ServiceState
 * @typedef {'mariadb' | 's3' | 'mail'} ServiceName
 * @typedef {{ home: string, mariadb: ServiceState | null, s3: ServiceState | null, mail: ServiceState | null }} ServiceFacts
 */

/** Tried first; taken ones are passed over and the choice is remembered. */
const PREFERRED_PORTS = { s3: 3101, smtp: 3102, inbox: 3103, mariadb: 3104 };
/** A variable of the user's own that names a service elsewhere; then ours is not started. */
const ELSEWHERE = { mariadb: 'DATABASE_HOST', s3: 'S3_ENDPOINT', mail: 'SMTP_URL' };
const NAMES = /** @type {ServiceName[]} */ (Object.keys(ELSEWHERE));

/** @param {string} home */
const statePath = (home) => join(home, 'services.json');

/**
 * @param {string} home
 * @returns {Partial<Record<ServiceName, ServiceState>>}
 */
export const readServiceStates = (home) => findJson(statePath(home)) ?? {};

/**
 * @param {string} home
 * @param {ServiceName} name
 * @param {ServiceState} state
 */
function remember(home, name, state) {
  const states = readServiceStates(home);
  writeJson(statePath(home), { ...states, [name]: { ...states[name], ...state } });
}

/**
 * Starts a service written in this folder, detached, and waits for its ready file.
 * @param {string} home
 * @param {ServiceName} name
 * @param {string} script
 * @param {Record<string, string>} variables
 */
async function startOwnService(home, name, script, variables) {
  const folder = join(home, 'run');
  mkdirSync(folder, { recursive: true });
  const [ready, logFile] = [join(folder, `${name}.ready.json`), join(folder, `${name}.log`)];
  rmSync(ready, { force: true });
  const log = openSync(logFile, 'w');
  const child = spawn(process.execPath, ['--import', 'tsx', join(ROOT, 'docker-local', script)], {
    cwd: ROOT,
    env: { ...process.env, ...variables, HEARTCUT_READY_FILE: ready },
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  if (child.pid === undefined) throw new Error(`${script} could not be started.`);
  const identity = identify(child.pid);
  remember(home, name, identity);
  child.unref();
  for (let waitedMs = 0; waitedMs < 30_000 && isAlive(identity); waitedMs += 25) {
    const facts = findJson(ready);
    if (facts) return remember(home, name, { ...facts, ...identity });
    await wait(25);
  }
  await stopProcess(identity);
  throw new Error(`${script} did not start. ${logFile} says:\n${readFileSync(logFile, 'utf8').slice(-2000)}`);
}

/**
 * @param {string} home
 * @param {ServiceName} name
 * @param {{ say: (text: string) => void, allowFaults: boolean }} options
 */
async function start(home, name, { say, allowFaults }) {
  const secrets = readSecrets(home);
  const before = readServiceStates(home)[name];
  if (name === 'mariadb') {
    await requireMariadb();
    const folder = join(home, 'mariadb');
    const preferredPort = before?.port ?? PREFERRED_PORTS.mariadb;
    const onSpawn = (/** @type {ServiceState} */ identity) => remember(home, name, identity);
    remember(home, name, await startMariadb({ folder, preferredPort, say, onSpawn }));
  } else if (name === 's3') {
    await startOwnService(home, name, 'object-store/main.ts', {
      OBJECT_STORE_FOLDER: join(home, 'objects'),
      OBJECT_STORE_ACCESS_KEY: secrets.storeAccessKey,
      OBJECT_STORE_SECRET_KEY: secrets.storeSecretKey,
      OBJECT_STORE_BUCKET: BUCKET,
      OBJECT_STORE_PORT: String(before?.port ?? PREFERRED_PORTS.s3),
      OBJECT_STORE_ALLOW_FAULTS: allowFaults ? '1' : '0',
    });
  } else {
    await startOwnService(home, name, 'mail/main.ts', {
      MAIL_FOLDER: join(home, 'mail'),
      MAIL_SMTP_PORT: String(before?.port ?? PREFERRED_PORTS.smtp),
      MAIL_INBOX_PORT: String(before?.inboxPort ?? PREFERRED_PORTS.inbox),
    });
  }
}

/**
 * Makes sure the local services of a home folder run, and answers how to reach them. Idempotent; two callers take
 * turns. A service that the user's environment names elsewhere is null. `hold` keeps them up until the caller's
 * process releases them or dies; `keep` keeps them up until services:down.
 * @param {{ home: string, hold?: boolean, keep?: boolean, allowFaults?: boolean, say?: (text: string) => void,
 *   environment?: Record<string, string | undefined> }} options
 * @returns {Promise<ServiceFacts>}
 */
export async function ensureServices({
  home,
  hold = false,
  keep = false,
  allowFaults = false,
  say = console.log,
  environment = process.env,
}) {
  mkdirSync(home, { recursive: true });
  return withLock(
    join(home, 'services.lock'),
    { what: 'Starting or stopping the services', patienceMs: 120_000 },
    async () => {
      if (hold) addHolder(home, 'process');
      if (keep) addHolder(home, 'keep');
      readSecrets(home);
      const wanted = NAMES.filter((name) => !environment[ELSEWHERE[name]]);
      const started = await Promise.allSettled(
        wanted.map(async (name) => {
          const state = readServiceStates(home)[name];
          if (isAlive(state) && findJson(join(home, 'run', 'complete.json'))?.[name] === state?.pid) return;
          // Alive but never finished starting: an interrupted start left it.
          if (isAlive(state)) await stopProcess(state);
          await start(home, name, { say, allowFaults });
        }),
      );
      // All have ended, well or badly, before the lock is given back.
      const failure = started.find((result) => result.status === 'rejected');
      if (failure) throw failure.reason;
      const states = readServiceStates(home);
      if (wanted.includes('mariadb')) await prepareAccounts(states.mariadb?.socket ?? '', readSecrets(home));
      writeJson(
        join(home, 'run', 'complete.json'),
        Object.fromEntries(wanted.map((name) => [name, states[name]?.pid])),
      );
      const pick = (/** @type {ServiceName} */ name) =>
        wanted.includes(name) ? (states[name] ?? null) : null;
      return { home, mariadb: pick('mariadb'), s3: pick('s3'), mail: pick('mail') };
    },
  );
}

/** Stops all, the database last. @param {string} home */
async function stopAll(home) {
  const states = readServiceStates(home);
  await Promise.all([stopProcess(states.mail), stopProcess(states.s3)]);
  await stopProcess(states.mariadb, 60_000);
}

/**
 * Gives up this process's hold; the services stop when nobody else holds them and services:up was not used.
 * @param {string} home
 */
export async function releaseServices(home) {
  await withLock(
    join(home, 'services.lock'),
    { what: 'Starting or stopping the services', patienceMs: 120_000 },
    async () => {
      removeHolder(home, 'process');
      if (listHolders(home).length === 0) await stopAll(home);
    },
  );
}

/**
 * services:down. Throws when a running app still uses them.
 * @param {string} home
 */
export async function stopServices(home) {
  await withLock(
    join(home, 'services.lock'),
    { what: 'Starting or stopping the services', patienceMs: 120_000 },
    async () => {
      removeHolder(home, 'keep');
      const users = listHolders(home);
      if (users.length > 0)
        throw new Error(`Process ${users.join(', ')} uses the services. Stop it; they stop with it now.`);
      await stopAll(home);
    },
  );
}
