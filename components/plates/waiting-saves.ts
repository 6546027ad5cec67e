import type { PlateInput, PlateView } from '@/lib/evidence/tlc/schema';
import { ApiError } from '@/lib/http/client';
import type { SaveStore } from './marking-store';

/** Marks on their way to the server. */
export type WaitingSave = {
  id: string;
  userId: string;
  /** Sent with every try, so that the server does it once however often it is asked. */
  idempotencyKey: string;
  at: string;
  runCode: string;
  photo: { id: string; fileName: string };
  plate: { id: string; version: number } | null;
  body: PlateInput;
  state: 'waiting' | 'refused';
  /** What the server or the network said last, in words. */
  words: string | null;
  errors: { path: string; message: string }[];
  /** How often it went out, the try that is under way included. */
  tries: number;
  conflicts: number;
};

export type SaveOutcome =
  | { state: 'sent'; save: WaitingSave; plate: PlateView }
  | { state: 'waiting' | 'refused'; save: WaitingSave };

/** The server may still be at work on an earlier try of which the answer was lost: it says 409 for a while. */
const mostConflicts = 3;

/**
 * Network gone, server busy, or signed out: the marks wait. Everything else is an answer to these marks; so is a 409
 * to the very first try.
 */
function shouldWait({ status }: ApiError, { tries, conflicts }: WaitingSave): boolean {
  if (status === 409) return tries > 1 && conflicts < mostConflicts;
  return status === 0 || status === 401 || status === 408 || status === 429 || status >= 500;
}

function waitingWords({ status, detail }: ApiError): string {
  if (status === 0) return 'The server cannot be reached.';
  return status === 401 ? 'You are signed out. Sign in again, and they are sent.' : detail;
}

async function sendOne(
  store: SaveStore,
  save: WaitingSave,
  send: (save: WaitingSave) => Promise<PlateView>,
): Promise<SaveOutcome> {
  // Counted before it goes out: the page may be closed before the answer comes.
  const tried = { ...save, tries: save.tries + 1 };
  await store.put(tried);
  try {
    const plate = await send(tried);
    await store.drop(save.id);
    return { state: 'sent', save: tried, plate };
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    const counted = { ...tried, conflicts: tried.conflicts + (error.status === 409 ? 1 : 0) };
    const state = shouldWait(error, counted) ? 'waiting' : 'refused';
    const words = state === 'waiting' ? waitingWords(error) : error.detail;
    const next: WaitingSave = { ...counted, state, words, errors: error.errors };
    await store.put(next);
    return { state, save: next };
  }
}

/**
 * Sends what waits, the oldest first. After a save that has to go on waiting the rest is not tried: the network is
 * away for them too. A refused save stays refused until a person decides.
 */
export async function sendWaiting(
  store: SaveStore,
  userId: string,
  send: (save: WaitingSave) => Promise<PlateView>,
): Promise<SaveOutcome[]> {
  const outcomes: SaveOutcome[] = [];
  for (const save of await store.list(userId)) {
    if (save.state === 'refused') continue;
    const outcome = await sendOne(store, save, send);
    outcomes.push(outcome);
    if (outcome.state === 'waiting') break;
  }
  return outcomes;
}

/** A refused save that is tried again is a new request: the server keeps its answer to the old one. */
export function triedAgain(save: WaitingSave, idempotencyKey: string): WaitingSave {
  return { ...save, idempotencyKey, state: 'waiting', words: null, errors: [], tries: 0, conflicts: 0 };
}
