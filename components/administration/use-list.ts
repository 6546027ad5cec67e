'use client';
import useSWR from 'swr';
import { fetcher } from '@/lib/http/client';

/** One page of a list of the administration API, kept fresh by swr. */
export function useList<T>(path: string) {
  const { data, error, isLoading, mutate } = useSWR<{ items: T[]; nextCursor: string | null }>(path, fetcher);
  return {
    items: data?.items ?? [],
    failed: error as Error | undefined,
    loading: isLoading,
    refresh: () => mutate(),
  };
}
