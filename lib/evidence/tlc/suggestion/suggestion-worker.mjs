// Entry of the worker thread. It is started by its path on disk, outside of any bundle, so it brings its own
// loader for the TypeScript beside it: that makes it the same in tests, in development and in a production build.
import { parentPort } from 'node:worker_threads';
import { register } from 'tsx/esm/api';

register();
const { suggestFromPhoto } = await import('./read-photo.ts');
const { warmUp } = await import('./warm-up.ts');

parentPort?.on('message', async ({ id, source }) => {
  if (id === undefined) return warmUp();
  try {
    const suggestion = await suggestFromPhoto(typeof source === 'string' ? source : Buffer.from(source));
    parentPort?.postMessage({ id, suggestion });
  } catch (error) {
    parentPort?.postMessage({ id, error: error instanceof Error ? error.message : String(error) });
  }
});
