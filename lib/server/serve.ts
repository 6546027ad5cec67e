import { closeDatabase } from '@/lib/database/connection';
import { env } from '@/lib/env';
import { prepareSuggestions, stopSuggestions } from '@/lib/evidence/tlc/suggestion/suggest-plate-from-file';
import { log } from '@/lib/log';
import { startHousekeeping } from './housekeeping';
import { startHttpServer } from './http-server';
import { checkBeforeStart } from './start-checks';

/** The process behind `npm start`: check, listen, and stop gracefully on SIGTERM or SIGINT. */
const started = performance.now();
await checkBeforeStart();
const server = await startHttpServer({ port: env().port, host: env().host, dir: process.cwd() });
const stopHousekeeping = startHousekeeping();
log().info({ port: server.port, ms: Math.round(performance.now() - started) }, 'ready');
process.send?.({ ready: true, port: server.port });
// After the server is ready, so that nobody waits for it: the first photo of the day finds a warm thread.
prepareSuggestions();

let stopping = false;
async function stop(signal: string): Promise<void> {
  if (stopping) return;
  stopping = true;
  log().info({ signal }, 'stopping: finishing what is under way');
  await stopHousekeeping();
  await server.close();
  await stopSuggestions();
  await closeDatabase();
  log().info('stopped');
  process.exit(0);
}
process.on('SIGTERM', () => void stop('SIGTERM'));
process.on('SIGINT', () => void stop('SIGINT'));
