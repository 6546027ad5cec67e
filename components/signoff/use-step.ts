'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { sayDone } from '@/components/ui/toaster';
import { api, ApiError } from '@/lib/http/client';

/**
 * Takes one step of a fraction: sends it with the version that the page shows, then renews the page. What the
 * server says no to is kept as `error` for the dialog, which stays open with what was typed.
 */
export function useStep(code: string, version: number) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<string | null>(null);

  async function take(step: string, body: unknown, done: string): Promise<boolean> {
    setBusy(true);
    setError(null);
    try {
      await api(`/api/v1/fractions/${encodeURIComponent(code)}/${step}`, { json: body, version });
      sayDone(done);
      router.refresh();
      return true;
    } catch (problem) {
      setError(problem instanceof ApiError ? problem.detail : 'That did not work. Try again.');
      return false;
    } finally {
      setBusy(false);
    }
  }
  return { take, busy, error, clear: () => setError(null) };
}
