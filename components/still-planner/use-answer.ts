'use client';
import { useState } from 'react';
import { failureOf, problemsOf } from '@/components/runs/problems-of';
import type { Problems } from '@/components/runs/read-form';
import { api } from '@/lib/http/client';

/** Asks one of the planner's sums; keeps the answer, or what is wrong with each field. */
export function useAnswer<T>(path: string) {
  const [answer, setAnswer] = useState<T | null>(null);
  const [problems, setProblems] = useState<Problems>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  async function ask(body: unknown) {
    setBusy(true);
    setFailure(null);
    setProblems({});
    try {
      setAnswer(await api<T>(path, { json: body }));
    } catch (error) {
      setAnswer(null);
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
    } finally {
      setBusy(false);
    }
  }
  /** What the page found wrong before it asked. */
  function refuse(found: Problems) {
    setAnswer(null);
    setFailure(null);
    setProblems(found);
  }
  return { answer, problems, failure, busy, ask, refuse };
}
