'use client';
import { useState } from 'react';
import type { PlateInput, PlateView } from '@/lib/evidence/tlc/schema';
import { api, ApiError } from '@/lib/http/client';

export type SaveTarget = { runCode: string; plate: { id: string; version: number } | null };

/** Saves the marks and keeps what went wrong, field by field. */
export function useSavePlate({ runCode, plate }: SaveTarget) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiError | null>(null);
  async function save(body: PlateInput): Promise<PlateView | null> {
    setBusy(true);
    setProblem(null);
    try {
      return plate
        ? await api<PlateView>(`/api/v1/plates/${plate.id}`, {
            method: 'PATCH',
            json: body,
            version: plate.version,
          })
        : await api<PlateView>(`/api/v1/runs/${encodeURIComponent(runCode)}/plates`, { json: body });
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      setProblem(error);
      return null;
    } finally {
      setBusy(false);
    }
  }
  const errorOf = (path: string) => problem?.errors.find((one) => one.path === path)?.message ?? null;
  return { save, busy, problem, errorOf };
}
