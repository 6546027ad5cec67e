import { createObjectStore } from './server';
import { listenFrom, announceReady, stopOnSignal } from '../service-process.mjs';

/** Starts the store from its environment; see `services.mjs`, which sets these variables. */
const { OBJECT_STORE_FOLDER, OBJECT_STORE_ACCESS_KEY, OBJECT_STORE_SECRET_KEY, OBJECT_STORE_BUCKET } =
  process.env;
if (!OBJECT_STORE_FOLDER || !OBJECT_STORE_ACCESS_KEY || !OBJECT_STORE_SECRET_KEY) {
  throw new Error('Set OBJECT_STORE_FOLDER, OBJECT_STORE_ACCESS_KEY and OBJECT_STORE_SECRET_KEY.');
}

// Evidence and mail are nobody else's business on a shared machine.
process.umask(0o077);
const server = createObjectStore({
  folder: OBJECT_STORE_FOLDER,
  credentials: { accessKeyId: OBJECT_STORE_ACCESS_KEY, secretAccessKey: OBJECT_STORE_SECRET_KEY },
  buckets: OBJECT_STORE_BUCKET ? [OBJECT_STORE_BUCKET] : [],
  allowFaults: process.env.OBJECT_STORE_ALLOW_FAULTS === '1',
});
const port = await listenFrom(server, Number(process.env.OBJECT_STORE_PORT ?? 0));
announceReady({ port });
stopOnSignal(async () => {
  server.closeAllConnections();
  server.close();
});
