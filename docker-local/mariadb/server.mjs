import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  chownSync,
  existsSync,
  lstatSync,
  mkdirSync,
  openSync,
  readFileSync,
  renameSync,
  rmSync,
  closeSync,
} from 'node:fs';
import { connect, createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { findProgram } from '../commands.mjs';
import { identify } from '../processes.mjs';
import { listenFrom } from '../service-process.mjs';

/** sockaddr_un holds 108 bytes with the closing zero (unix(7)). */
const MAX_SOCKET_PATH_BYTES = 106;

/**
 * Who the server runs as. mariadbd refuses to be root by accident, so as root it becomes `mysql`; where that account
 * cannot reach the folder (a home below /root), it stays root, asked for by name.
 * @param {string} folder
 * @param {(text: string) => void} say
 */
function chooseOwner(folder, say) {
  if (process.getuid?.() !== 0) return { ids: {}, args: [] };
  const number = (/** @type {string} */ flag) =>
    Number(spawnSync('id', [flag, 'mysql'], { encoding: 'utf8' }).stdout || 'NaN');
  const [uid, gid] = [number('-u'), number('-g')];
  if (Number.isInteger(uid)) {
    chownSync(folder, uid, gid);
    const reach = spawnSync('test', ['-w', folder, '-a', '-x', folder], { uid, gid, cwd: '/' });
    if (reach.status === 0) return { ids: { uid, gid }, args: [] };
    say(
      `The account mysql cannot reach ${folder}, so MariaDB runs as root there. Set HEARTCUT_HOME to a folder it can reach to change that.`,
    );
    chownSync(folder, 0, 0);
  }
  return { ids: {}, args: ['--user=root'] };
}

/**
 * @param {string} folder
 * @param {{ uid?: number, gid?: number }} ids
 */
function chooseSocket(folder, ids) {
  const near = join(folder, 'mariadb.sock');
  if (Buffer.byteLength(near) <= MAX_SOCKET_PATH_BYTES) return near;
  const far = join(tmpdir(), `heartcut-${createHash('sha256').update(folder).digest('hex').slice(0, 12)}`);
  mkdirSync(far, { recursive: true, mode: 0o700 });
  const uid = ids.uid ?? process.getuid?.() ?? 0;
  const { uid: owner } = lstatSync(far);
  // Everybody may write in the temporary directory: a folder that somebody else put here is not to be trusted.
  if (owner !== uid && owner !== process.getuid?.()) {
    throw new Error(`${far} belongs to another account. Remove it, or set HEARTCUT_HOME to a shorter path.`);
  }
  if (owner !== uid) chownSync(far, uid, ids.gid ?? 0);
  return join(far, 'mariadb.sock');
}

/**
 * @param {string} datadir
 * @param {ReturnType<typeof chooseOwner>} owner
 */
async function createDatadir(datadir, owner) {
  const fresh = `${datadir}.new`;
  rmSync(fresh, { recursive: true, force: true });
  mkdirSync(fresh, { mode: 0o700 });
  if (owner.ids.uid !== undefined) chownSync(fresh, owner.ids.uid, owner.ids.gid ?? 0);
  const args = [
    '--no-defaults',
    '--basedir=/usr',
    `--datadir=${fresh}`,
    '--auth-root-authentication-method=normal',
  ];
  const program = findProgram('mariadb-install-db') ?? 'mariadb-install-db';
  const child = spawn(program, [...args, '--skip-test-db', ...owner.args], { ...owner.ids, cwd: fresh });
  let output = '';
  child.stdout.on('data', (bytes) => (output += bytes));
  child.stderr.on('data', (bytes) => (output += bytes));
  const code = await new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
  if (code !== 0) throw new Error(`MariaDB could not make its data folder:\n${output}`);
  // The name appears only when the work is whole: an interrupted first start begins anew.
  renameSync(fresh, datadir);
}

/** @param {number} firstPort */
async function findFreePort(firstPort) {
  const probe = createServer();
  const port = await listenFrom(probe, firstPort);
  await new Promise((resolve) => probe.close(resolve));
  return port;
}

/** @param {string} socket */
const answers = (socket) =>
  new Promise((resolve) => {
    const connection = connect(socket);
    connection.once('connect', () => resolve(true)).once('error', () => resolve(false));
    connection.once('connect', () => connection.destroy());
  });

/**
 * Starts a private MariaDB under `folder` on 127.0.0.1 and waits until it answers. It outlives this process.
 * `onSpawn` gets its identity before it is ready, so that an interrupted caller can find it again.
 * @param {{ folder: string, preferredPort: number, say: (text: string) => void,
 *   onSpawn: (identity: import('../processes.mjs').ProcessIdentity) => void }} options
 */
export async function startMariadb({ folder, preferredPort, say, onSpawn }) {
  mkdirSync(folder, { recursive: true });
  const owner = chooseOwner(folder, say);
  const datadir = join(folder, 'data');
  if (!existsSync(datadir)) await createDatadir(datadir, owner);
  if (process.getuid?.() === 0)
    spawnSync('chown', ['-R', `${owner.ids.uid ?? 0}:${owner.ids.gid ?? 0}`, datadir]);
  const socket = chooseSocket(folder, owner.ids);
  const pidFile = join(folder, 'mariadb.pid');
  const logFile = join(folder, 'mariadb.log');
  for (let port = preferredPort, attempt = 0; attempt < 3; port += 1, attempt += 1) {
    port = await findFreePort(port);
    rmSync(pidFile, { force: true });
    const log = openSync(logFile, 'w');
    const args = [
      '--no-defaults',
      `--datadir=${datadir}`,
      `--socket=${socket}`,
      `--pid-file=${pidFile}`,
      '--bind-address=127.0.0.1',
      `--port=${port}`,
      '--character-set-server=utf8mb4',
      '--collation-server=utf8mb4_unicode_ci',
      '--skip-name-resolve',
      '--innodb-buffer-pool-size=256M',
      '--innodb-flush-log-at-trx-commit=1',
      '--max-allowed-packet=64M',
      '--local-infile=OFF',
      ...owner.args,
    ];
    const program = findProgram('mariadbd') ?? 'mariadbd';
    const child = spawn(program, args, {
      ...owner.ids,
      cwd: datadir,
      detached: true,
      stdio: ['ignore', log, log],
    });
    closeSync(log);
    const failed = new Promise((resolve) => child.once('error', resolve).once('exit', resolve)).then(
      () => true,
    );
    if (child.pid === undefined)
      throw new Error('MariaDB could not be started: is mariadb-server installed?');
    const identity = identify(child.pid);
    onSpawn(identity);
    child.unref();
    for (let waitedMs = 0; waitedMs < 60_000; waitedMs += 50) {
      // Its own pid in the file: another server on this folder would answer too.
      const written = existsSync(pidFile) && Number(readFileSync(pidFile, 'utf8')) === child.pid;
      if (written && (await answers(socket))) return { ...identity, port, socket };
      if (await Promise.race([failed, wait(50, false)])) break;
    }
  }
  throw new Error(
    `MariaDB did not start. The end of ${logFile} says:\n${readFileSync(logFile, 'utf8').split('\n').slice(-12).join('\n')}`,
  );
}
