'use client';
import { useState } from 'react';
import type { RunChange, RunJson } from '@/lib/distillation/schema';
import { api, ApiError } from '@/lib/http/client';
import { failureOf, problemsOf } from './problems-of';
import type { Problems } from './read-form';

/**
 * Saves changes of a run. When somebody else changed it meanwhile, nothing is kept: `newer` is the run as it is now, and
 * saving once more puts the changes on top of it.
 */
export function useSaveRun(opened: RunJson) {
  const [newer, setNewer] = useState<RunJson | null>(null);
  const [problems, setProblems] = useState<Problems>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const path = `/api/v1/runs/${encodeURIComponent(opened.code)}`;

  async function save(json: RunChange): Promise<boolean> {
    setBusy(true);
    setFailure(null);
    try {
      await api<RunJson>(path, { method: 'PATCH', json, version: (newer ?? opened).version });
      return true;
    } catch (error) {
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
      if (error instanceof ApiError && error.status === 409)
        setNewer(await api<RunJson>(path).catch(() => null));
      setBusy(false);
      return false;
    }
  }
  return { save, busy, newer, problems, setProblems, failure, setFailure };
}
