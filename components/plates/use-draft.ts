'use client';
import { useEffect, useState } from 'react';
import type { Draft } from './draft';
import { dropDraft, keepDraft, readDraft } from './marking-store';

const keepAfterMs = 250;

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
    const timer = setTimeout(
      () => void keepDraft(userId, evidenceId, { marks, facts, proposal }).then(setIsKept),
      keepAfterMs,
    );
    return () => clearTimeout(timer);
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
