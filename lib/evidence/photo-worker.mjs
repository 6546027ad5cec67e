// Entry of the worker thread for photos. It is started by its path on disk, outside of any bundle, so it brings its
// own loader for the TypeScript beside it: the same in tests, in development and in a production build.
import { parentPort } from 'node:worker_threads';
import { register } from 'tsx/esm/api';

register();
const { doPhotoJob } = await import('./photo-jobs.ts');

parentPort?.on('message', async (job) => {
  try {
    parentPort?.postMessage({ result: await doPhotoJob(job) });
  } catch (error) {
    const isForUser = error instanceof Error && error.constructor.name === 'HeicProblem';
    parentPort?.postMessage({ error: error instanceof Error ? error.message : String(error), isForUser });
  }
});
