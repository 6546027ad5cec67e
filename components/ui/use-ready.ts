'use client';
import { useSyncExternalStore } from 'react';

const never = () => () => {};

/** False until the page's script has taken over: a form with secrets must not be sent by the bare browser before. */
export function useReady(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
