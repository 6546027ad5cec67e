'use client';
import { useCallback, useEffect, useRef, useState } from 'react';
import { v4 as newKey } from 'uuid';
import type { PlateView } from '@/lib/evidence/tlc/schema';
import { api, ApiError } from '@/lib/http/client';
import { dropDraft, saveStore } from './marking-store';
import { type SaveOutcome, sendWaiting, triedAgain, type WaitingSave } from './waiting-saves';

/** How often a save that waits is tried without being told that the network is back, ms. */
const tryEveryMs = 10_000;

/** A network that is there but carries nothing: given up for now, and asked again with the same key. */
const patienceMs = 45_000;

function impatient<T>(work: Promise<T>): Promise<T> {
  let timer: ReturnType<typeof setTimeout>;
  const late = new Promise<never>((_done, fail) => {
    timer = setTimeout(() => fail(new ApiError(0, 'The server does not answer.')), patienceMs);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}

function sendOverApi({ plate, runCode, body, idempotencyKey }: WaitingSave): Promise<PlateView> {
  return plate
    ? api<PlateView>(`/api/v1/plates/${plate.id}`, {
        method: 'PATCH',
        json: body,
        version: plate.version,
        idempotencyKey,
      })
    : api<PlateView>(`/api/v1/runs/${encodeURIComponent(runCode)}/plates`, { json: body, idempotencyKey });
}

/** One tab at a time sends, where the browser can tell. */
async function alone<T>(work: () => Promise<T>): Promise<T> {
  // Not offered without a secure connection.
  return 'locks' in navigator ? navigator.locks.request('heartcut-saves', work) : work();
}

export type Sent = { save: WaitingSave; plate: PlateView };

/**
 * Marks that are to be saved: each is kept on the device first, then sent, and sent again when the network is back or
 * the page is opened anew, with the same key each time, so that nothing is lost and nothing is saved twice.
 */
export function useSaveQueue(userId: string, onSent?: (sent: Sent) => void) {
  const [waiting, setWaiting] = useState<WaitingSave[]>([]);
  const [sent, setSent] = useState<Sent[]>([]);
  const [busy, setBusy] = useState(false);
  const tell = useRef(onSent);
  useEffect(() => {
    tell.current = onSent;
  }, [onSent]);

  const run = useCallback(async (): Promise<SaveOutcome[]> => {
    const store = await saveStore();
    const outcomes = await alone(() => sendWaiting(store, userId, (save) => impatient(sendOverApi(save))));
    for (const outcome of outcomes) {
      if (outcome.state !== 'sent') continue;
      await dropDraft(userId, outcome.save.photo.id, outcome.save.at);
      setSent((before) => [...before, outcome]);
      tell.current?.(outcome);
    }
    setWaiting(await store.list(userId));
    return outcomes;
  }, [userId]);

  useEffect(() => {
    const now = () => void run();
    now();
    window.addEventListener('online', now);
    return () => window.removeEventListener('online', now);
  }, [run]);

  const isWaiting = waiting.some((save) => save.state === 'waiting');
  useEffect(() => {
    if (!isWaiting) return;
    const timer = setInterval(() => void run(), tryEveryMs);
    return () => clearInterval(timer);
  }, [isWaiting, run]);

  async function save(wanted: Pick<WaitingSave, 'runCode' | 'photo' | 'plate' | 'body'>): Promise<void> {
    setBusy(true);
    try {
      const store = await saveStore();
      const before = (await store.list(userId)).filter((one) => one.photo.id === wanted.photo.id);
      // Refused marks of this photo give way to these; marks that wait may have arrived, so they stay.
      for (const old of before) if (old.state === 'refused') await store.drop(old.id);
      const fresh = { state: 'waiting', words: null, tries: 0, conflicts: 0 } as const;
      const at = new Date().toISOString();
      const ids = { id: newKey(), idempotencyKey: newKey() };
      await store.put({ ...wanted, ...fresh, ...ids, errors: [], userId, at });
      await run();
    } finally {
      setBusy(false);
    }
  }
  async function tryAgain(one: WaitingSave) {
    const again = one.state === 'refused' ? triedAgain(one, newKey()) : one;
    await (await saveStore()).put(again);
    await run();
  }
  async function discard(one: WaitingSave) {
    await (await saveStore()).drop(one.id);
    setWaiting(await (await saveStore()).list(userId));
  }
  return { waiting, sent, busy, save, tryAgain, discard };
}

export type SaveQueue = ReturnType<typeof useSaveQueue>;
