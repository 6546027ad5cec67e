'use client';
import { useEffect, useState } from 'react';
import type { Draft } from './draft';
import { dropDraft, keepDraft, readDraft } from './marking-store';

/** Short enough that a quick reload loses nothing, long enough that a drag is not a hundred writes a second. */
const keepAfterMs = 50;

/**
 * The draft of a photo on this device: kept while something is touched; one that was there when the page opened is
 * offered, never taken by itself. `isKept` is false when the device refuses to keep it.
 */
export function useDraft(userId: string, evidenceId: string, now: Omit<Draft, 'keptAt'>, touched: boolean) {
  const [found, setFound] = useState<Draft | null>(null);
  const [isKept, setIsKept] = useState(true);
  useEffect(() => {
    let isHere = true;
    void readDraft(userId, evidenceId).then((draft) => isHere && setFound(draft));
    return () => {
      isHere = false;
    };
  }, [userId, evidenceId]);

  const { marks, facts, proposal } = now;
  useEffect(() => {
    if (!touched) return;
    const keep = () => void keepDraft(userId, evidenceId, { marks, facts, proposal }).then(setIsKept);
    const timer = setTimeout(keep, keepAfterMs);
    // A page that goes away before that keeps what it has.
    window.addEventListener('pagehide', keep, { once: true });
    return () => {
      clearTimeout(timer);
      window.removeEventListener('pagehide', keep);
    };
  }, [touched, userId, evidenceId, marks, facts, proposal]);

  return {
    draft: touched ? null : found,
    isKept,
    forget: () => setFound(null),
    drop: () => {
      setFound(null);
      void dropDraft(userId, evidenceId);
    },
  };
}
