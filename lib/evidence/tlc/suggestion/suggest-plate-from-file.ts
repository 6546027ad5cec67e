import { Problem } from '@/lib/errors';
import type { PlateSuggestion } from './suggestion';
import { SuggestionThread, ThreadStopped } from './suggestion-thread';

/** Photos wait their turn; one that is not done after this time is given up. */
export const DEFAULT_TIME_LIMIT_MS = 20_000;
/** More photos than this at a time are turned away. */
const MOST_WAITING = 8;

// One thread a process: the server's own code and the bundled routes are separate copies of this module.
const shared = globalThis as { heartcutSuggestionThread?: SuggestionThread };
const thread = (shared.heartcutSuggestionThread ??= new SuggestionThread());
let waiting = 0;

/**
 * Proposes corners, lines, lanes and spots of a plate's photo (JPEG, PNG, WebP or TIFF; a path or the bytes) in a
 * thread of its own, so that the server goes on answering. Places are pixels of the photo as shown, after its EXIF
 * orientation. Throws a Problem: 422 for a photo that cannot be read, 429 when too many photos wait, 503 when the
 * time limit passes. Nothing is saved.
 */
export async function suggestPlateFromFile(
  source: string | Uint8Array,
  { timeLimitMs = DEFAULT_TIME_LIMIT_MS }: { timeLimitMs?: number } = {},
): Promise<PlateSuggestion> {
  if (waiting >= MOST_WAITING) {
    throw new Problem('too-many', 'Many photos are being looked at just now. Try again in a few seconds.', {
      retryAfterSeconds: 5,
    });
  }
  waiting += 1;
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(tookTooLong()), timeLimitMs);
  });
  try {
    return await Promise.race([thread.ask(source), late]);
  } catch (error) {
    if (error instanceof Problem) {
      // Whatever holds the thread up, the next photo gets a fresh one.
      await thread.stop();
      throw error;
    }
    if (error instanceof ThreadStopped) throw tookTooLong();
    throw new Problem(
      'invalid',
      'No plate can be looked for in this photo: it is damaged, too small or of a kind that cannot be read. Mark the plate by hand, or take the photo again.',
    );
  } finally {
    clearTimeout(timer);
    waiting -= 1;
  }
}

/** Starts the thread ahead of the first photo, for the start of the server: about a second of one core. */
export function prepareSuggestions() {
  thread.prepare();
}

/** Ends the thread, for the end of a test or of the server. */
export function stopSuggestions(): Promise<void> {
  return thread.stop();
}

function tookTooLong(): Problem {
  return new Problem(
    'unavailable',
    'Looking for the plate took too long and was given up. Mark the plate by hand, or try again later.',
  );
}
