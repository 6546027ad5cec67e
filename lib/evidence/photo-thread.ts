import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { Problem } from '@/lib/errors';
import type { PhotoJob, PhotoJobResult } from './photo-jobs';

type Answer = { result?: unknown; error?: string; isForUser?: boolean };

/** A job that is not done after this time is given up, and its thread with it. */
export const PHOTO_TIME_LIMIT_MS = 20_000;
/** More jobs than this at a time are turned away. */
const MOST_WAITING = 12;

let worker: Worker | null = null;
let last: Promise<unknown> = Promise.resolve();
let waiting = 0;

function start(): Worker {
  // A path from the working folder, unknown to any bundler: the file is run as it lies on disk.
  const file = join(/* turbopackIgnore: true */ process.cwd(), 'lib/evidence/photo-worker.mjs');
  // Without the flags of this process; what the decoder prints about a broken file goes nowhere.
  const started = new Worker(file, {
    execArgv: [],
    stdout: true,
    resourceLimits: { maxOldGenerationSizeMb: 512 },
  });
  started.stdout.resume();
  started.unref();
  return started;
}

/** Ends the thread, for the end of a test or after a job that hangs. The next job starts another one. */
export async function stopPhotoThread(): Promise<void> {
  const old = worker;
  worker = null;
  await old?.terminate();
}

function refusal({ error, isForUser }: Answer): Problem {
  return new Problem(
    'invalid',
    isForUser && error
      ? error
      : 'The photo cannot be read: it is damaged or of a kind that is not known here.',
  );
}

async function doNow(job: PhotoJob, timeLimitMs: number): Promise<unknown> {
  const busy = (worker ??= start());
  busy.ref();
  let forget = () => {};
  try {
    const answer = await new Promise<Answer>((resolve, reject) => {
      const lost = () => reject(new Error('The thread ended.'));
      const timer = setTimeout(lost, timeLimitMs);
      busy.on('message', resolve).on('error', lost).on('exit', lost);
      forget = () => {
        clearTimeout(timer);
        busy.off('message', resolve).off('error', lost).off('exit', lost);
      };
      busy.postMessage(job);
    });
    if (answer.error !== undefined) throw refusal(answer);
    return answer.result;
  } catch (error) {
    if (error instanceof Problem) throw error;
    if (worker === busy) await stopPhotoThread();
    throw new Problem(
      'unavailable',
      'Working on the photo took too long and was given up. Try again, or send a smaller photo as JPEG.',
      { retryAfterSeconds: 10 },
    );
  } finally {
    forget();
    busy.unref();
  }
}

/**
 * Has a job done in the thread for photos, one after the other, so that the server goes on answering. Throws a
 * Problem: 422 for a photo that cannot be read, 429 when too many wait, 503 when the time limit passes.
 */
export async function photoJob<K extends PhotoJob['kind']>(
  job: Extract<PhotoJob, { kind: K }>,
  { timeLimitMs = PHOTO_TIME_LIMIT_MS }: { timeLimitMs?: number } = {},
): Promise<PhotoJobResult[K]> {
  if (waiting >= MOST_WAITING)
    throw new Problem('too-many', 'Many photos are being worked on just now. Try again in a few seconds.', {
      retryAfterSeconds: 5,
    });
  waiting += 1;
  const done = last.then(() => doNow(job, timeLimitMs));
  last = done.catch(() => undefined);
  try {
    return (await done) as PhotoJobResult[K];
  } finally {
    waiting -= 1;
  }
}
