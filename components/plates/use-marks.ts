'use client';
import { useCallback, useEffect, useMemo, useReducer, useState, useSyncExternalStore } from 'react';
import { type Measured, measureMarks } from '@/lib/evidence/tlc/measure-marks';
import { type Draft, dropDraft, keepDraft, readDraft } from './draft-store';
import type { Facts } from './facts';
import type { Marks } from './marks';
import { type Extent, type MarksAction, type MarksState, reduceMarks, startMarks } from './marks-reducer';

const noSubscription = () => () => undefined;

/** Rf of the marks as they are now; no line yet, no Rf. */
function preview(marks: Marks, extent: Extent): Measured | null {
  if (marks.baseline.length < 2 || marks.front.length < 2) return null;
  return measureMarks({ units: 'px', ...marks, extent });
}

/**
 * Marks and facts of one photo: the reducer, the running Rf, and the draft on the device. A draft that was there when
 * the page opened is offered, never taken by itself.
 */
export function useMarks(evidenceId: string, extent: Extent, first: { marks: Marks; facts: Facts }) {
  const [state, dispatch] = useReducer(
    (now: MarksState, action: MarksAction) => reduceMarks(now, action, extent),
    first.marks,
    startMarks,
  );
  const [facts, setFacts] = useState(first.facts);
  const [factsTouched, setFactsTouched] = useState(false);
  const [answered, setAnswered] = useState(false);
  // Read once the page runs in the browser, so that the server's page and the first one drawn are the same.
  const isBrowser = useSyncExternalStore(
    noSubscription,
    () => true,
    () => false,
  );
  const [found, setFound] = useState<Draft | null | undefined>(undefined);
  if (isBrowser && found === undefined) setFound(readDraft(evidenceId));

  const touched = state.changes > 0 || factsTouched;
  useEffect(() => {
    if (!touched) return;
    const timer = setTimeout(() => keepDraft(evidenceId, { marks: state.marks, facts }), 250);
    return () => clearTimeout(timer);
  }, [touched, evidenceId, state.marks, facts]);

  const changeFacts = useCallback((change: Partial<Facts>) => {
    setFacts((now) => ({ ...now, ...change }));
    setFactsTouched(true);
  }, []);
  const takeDraft = () => {
    if (!found) return;
    dispatch({ type: 'load', marks: found.marks, changed: true });
    setFacts(found.facts);
    setAnswered(true);
  };
  const refuseDraft = () => {
    dropDraft(evidenceId);
    setAnswered(true);
  };
  const measured = useMemo(() => preview(state.marks, extent), [state.marks, extent]);
  return {
    state,
    dispatch,
    facts,
    changeFacts,
    measured,
    touched,
    draft: !answered && !touched ? (found ?? null) : null,
    takeDraft,
    refuseDraft,
  };
}

export type MarksHandle = ReturnType<typeof useMarks>;
