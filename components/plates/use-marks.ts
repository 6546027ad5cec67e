'use client';
import { useCallback, useMemo, useReducer, useState } from 'react';
import { type Measured, measureMarks } from '@/lib/evidence/tlc/measure-marks';
import type { PlateSize } from '@/lib/evidence/tlc/plate-frame';
import { type Facts, sizeOf } from './facts';
import type { Marks } from './marks';
import { type Extent, type MarksAction, type MarksState, reduceMarks, startMarks } from './marks-reducer';
import { frameOf } from './plate-view';
import type { Proposal } from './proposals';
import { useDraft } from './use-draft';

/** Rf of the marks as they are now, by the same sums as on the server; no line yet, no Rf. */
export function preview(marks: Marks, extent: Extent, size: PlateSize): Measured | null {
  if (marks.baseline.length < 2 || marks.front.length < 2) return null;
  const corners = marks.corners.length === 4 ? marks.corners : null;
  return measureMarks({ units: 'px', ...marks, ...size, corners, extent });
}

/** Marks and facts of one photo: the reducer, the running Rf, the plate's plane, and the draft on the device. */
export function useMarks(
  owner: { userId: string; evidenceId: string },
  extent: Extent,
  first: { marks: Marks; facts: Facts },
) {
  const [state, dispatch] = useReducer(
    (now: MarksState, action: MarksAction) => reduceMarks(now, action, extent),
    first.marks,
    startMarks,
  );
  const [facts, setFacts] = useState(first.facts);
  const [factsTouched, setFactsTouched] = useState(false);
  const [proposal, setProposal] = useState<Proposal | null>(null);
  const touched = state.changes > 0 || factsTouched;
  const { marks } = state;
  const kept = useDraft(owner.userId, owner.evidenceId, { marks, facts, proposal }, touched);

  const changeFacts = useCallback((change: Partial<Facts>) => {
    setFacts((now) => ({ ...now, ...change }));
    setFactsTouched(true);
  }, []);
  const propose = useCallback((answer: Proposal) => {
    setProposal(answer);
    dispatch({ type: 'propose', proposal: answer });
  }, []);
  const takeDraft = () => {
    if (!kept.draft) return;
    dispatch({ type: 'load', marks: kept.draft.marks, changed: true });
    setFacts(kept.draft.facts);
    setProposal(kept.draft.proposal);
    kept.forget();
  };
  const { widthMm, heightMm } = facts;
  const size = useMemo(() => sizeOf({ widthMm, heightMm }), [widthMm, heightMm]);
  const measured = useMemo(() => preview(marks, extent, size), [marks, extent, size]);
  const frame = useMemo(() => frameOf(marks, size), [marks, size]);
  return {
    state,
    dispatch,
    facts,
    changeFacts,
    proposal,
    propose,
    size,
    measured,
    frame,
    touched,
    draft: kept.draft,
    isKept: kept.isKept,
    takeDraft,
    refuseDraft: kept.drop,
  };
}

export type MarksHandle = ReturnType<typeof useMarks>;
