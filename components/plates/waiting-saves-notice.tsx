'use client';
import { SaveStates } from './save-states';
import { useSaveQueue } from './use-save-queue';

/** On pages without a photo: sends marks that still wait on this device, and says what has become of them. */
export function WaitingSavesNotice({ userId }: { userId: string }) {
  return <SaveStates queue={useSaveQueue(userId)} />;
}
