import { stopCommands } from './commands.mjs';

/**
 * The frame of each long-running command: runs `work`, and when it ends, fails or is interrupted, runs `cleanUp`
 * once, then exits. `work` gets a promise that resolves when the user wants to stop.
 * @param {{ work: (stop: Promise<void>) => Promise<number>, cleanUp: () => Promise<void> }} parts
 */
export async function runUntilStopped({ work, cleanUp }) {
  let interrupted = 0;
  /** @type {() => void} */
  let wantStop = () => undefined;
  const stop = new Promise((resolve) => (wantStop = () => resolve(undefined)));
  for (const [signal, number] of /** @type {const} */ ([
    ['SIGINT', 2],
    ['SIGTERM', 15],
    ['SIGHUP', 1],
  ])) {
    process.on(signal, () => {
      // The terminal may be gone: what is still said must not end the clean-up.
      if (interrupted) return;
      interrupted = 128 + number;
      wantStop();
      stopCommands();
    });
  }
  process.stdout.on('error', () => undefined);
  process.stderr.on('error', () => undefined);
  let code = 1;
  try {
    code = await work(/** @type {Promise<void>} */ (stop));
  } catch (error) {
    if (!interrupted) console.error(`\n${error instanceof Error ? error.message : error}`);
  }
  try {
    await cleanUp();
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    code = code || 1;
  }
  process.exit(interrupted || code);
}
