'use client';
import { useSyncExternalStore } from 'react';

/** Share of the window's height that the whole photo may take. */
const share = 0.72;

function subscribe(onChange: () => void) {
  window.addEventListener('resize', onChange);
  return () => window.removeEventListener('resize', onChange);
}

/** The height in px of the screen that a photo is fitted into at 100 %. */
export function usePhotoRoom(): number {
  return useSyncExternalStore(
    subscribe,
    () => Math.round(window.innerHeight * share),
    () => 600,
  );
}
