import { connect } from 'node:net';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { env } from '@/lib/env';
import { isObjectStoreHealthy } from '@/storage/health';
import { version } from '@/package.json';

const patienceMs = 2_000;

async function isDatabaseHealthy(): Promise<boolean> {
  const slow = new Promise<false>((resolve) => setTimeout(() => resolve(false), patienceMs).unref());
  const asked = database()
    .query('SELECT 1', { type: QueryTypes.SELECT })
    .then(
      () => true,
      () => false,
    );
  return Promise.race([asked, slow]);
}

/** Whether something listens at the mail server's address. No mail is sent to find out. */
function isMailHealthy(): Promise<boolean> {
  const { hostname, port, protocol } = new URL(env().smtpUrl);
  return new Promise((resolve) => {
    const socket = connect({
      host: hostname,
      port: Number(port) || (protocol === 'smtps:' ? 465 : 25),
      timeout: patienceMs,
    });
    const end = (answer: boolean) => {
      socket.destroy();
      resolve(answer);
    };
    socket
      .once('connect', () => end(true))
      .once('error', () => end(false))
      .once('timeout', () => end(false));
  });
}

/** The state of what Heartcut leans on, without names, addresses or secrets. */
export async function readHealth() {
  const word = (up: boolean) => (up ? ('ok' as const) : ('away' as const));
  const [databaseUp, storageUp, mailUp] = await Promise.all([
    isDatabaseHealthy(),
    isObjectStoreHealthy(patienceMs),
    isMailHealthy(),
  ]);
  // Mail waits in the outbox while its server is away, so it does not stop anybody's work.
  return {
    status: word(databaseUp && storageUp),
    database: word(databaseUp),
    storage: word(storageUp),
    mail: word(mailUp),
    version,
  };
}
