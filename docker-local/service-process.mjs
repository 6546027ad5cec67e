import { renameSync, writeFileSync } from 'node:fs';

const MAX_PORTS_TRIED = 200;

/**
 * Listens on 127.0.0.1 at `firstPort`, or at the next free one above it. 0 lets the system choose.
 * @param {import('node:net').Server} server
 * @param {number} firstPort
 * @returns {Promise<number>} the port in use
 */
export async function listenFrom(server, firstPort) {
  for (let port = firstPort; port < firstPort + MAX_PORTS_TRIED; port += 1) {
    try {
      await new Promise((resolve, reject) => {
        server.once('error', reject);
        server.listen(port, '127.0.0.1', () => {
          server.off('error', reject);
          resolve(undefined);
        });
      });
      return /** @type {import('node:net').AddressInfo} */ (server.address()).port;
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EADDRINUSE') throw error;
    }
  }
  throw new Error(`No free port found from ${firstPort} on.`);
}

/**
 * Tells the starting process, through the file named in HEARTCUT_READY_FILE, that the service answers.
 * @param {Record<string, number>} facts
 */
export function announceReady(facts) {
  const file = process.env.HEARTCUT_READY_FILE;
  if (file) {
    writeFileSync(`${file}.new`, JSON.stringify({ ...facts, pid: process.pid }));
    renameSync(`${file}.new`, file);
  } else console.log(JSON.stringify(facts));
}

/**
 * Runs `stop` once on SIGTERM or SIGINT, then exits.
 * @param {() => Promise<void>} stop
 */
export function stopOnSignal(stop) {
  let stopping = false;
  const onSignal = () => {
    if (stopping) return;
    stopping = true;
    stop().finally(() => process.exit(0));
  };
  process.on('SIGTERM', onSignal);
  process.on('SIGINT', onSignal);
}
