import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import type { PlateSuggestion } from './suggestion';

type Answer = { id?: number; suggestion?: PlateSuggestion; error?: string };
type Waiting = { resolve: (suggestion: PlateSuggestion) => void; reject: (error: Error) => void };

/** The thread was stopped or died before it answered. */
export class ThreadStopped extends Error {}

/**
 * One thread that looks at photos one after the other, started with the first photo and kept, since the second
 * photo then costs no start and finds compiled code. It never keeps the process alive by itself.
 */
export class SuggestionThread {
  private worker: Worker | null = null;
  private readonly waiting = new Map<number, Waiting>();
  private lastId = 0;

  /** Sends a photo (its path, or its bytes, which are copied) and answers what was found. */
  ask(source: string | Uint8Array): Promise<PlateSuggestion> {
    const worker = this.worker ?? this.start();
    this.lastId += 1;
    const id = this.lastId;
    return new Promise((resolve, reject) => {
      this.waiting.set(id, { resolve, reject });
      worker.ref();
      worker.postMessage({ id, source });
    });
  }

  /** Starts the thread ahead of the first photo and has it warm up; returns at once. */
  prepare() {
    if (this.worker) return;
    const worker = this.start();
    worker.postMessage({});
    worker.unref();
  }

  /** Ends the thread; whoever waits gets ThreadStopped. The next question starts another one. */
  async stop(): Promise<void> {
    const worker = this.worker;
    this.worker = null;
    this.failAll(new ThreadStopped('The thread that looks at photos was stopped.'));
    await worker?.terminate();
  }

  private start(): Worker {
    // A path from the working folder, unknown to any bundler: the file is run as it lies on disk.
    const file = join(
      /* turbopackIgnore: true */ process.cwd(),
      'lib/evidence/tlc/suggestion/suggestion-worker.mjs',
    );
    // Without the flags of this process: its preloaded modules are none of the thread's business.
    const worker = new Worker(file, { execArgv: [], resourceLimits: { maxOldGenerationSizeMb: 512 } });
    worker.on('message', (answer: Answer) => {
      const asked = answer.id === undefined ? undefined : this.waiting.get(answer.id);
      if (answer.id === undefined || !asked) return;
      this.waiting.delete(answer.id);
      if (this.waiting.size === 0) worker.unref();
      if (answer.suggestion) asked.resolve(answer.suggestion);
      else asked.reject(new Error(answer.error ?? 'No answer.'));
    });
    const lost = (why: string) => {
      if (this.worker !== worker) return;
      this.worker = null;
      this.failAll(new ThreadStopped(why));
    };
    worker.on('error', (error) => lost(String(error)));
    worker.on('exit', (code) => lost(`The thread that looks at photos ended with ${code}.`));
    this.worker = worker;
    return worker;
  }

  private failAll(error: Error) {
    for (const { reject } of this.waiting.values()) reject(error);
    this.waiting.clear();
  }
}
