'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { sayDone } from '@/components/ui/toaster';
import { requestOf, whatIsMissing } from './facts';
import { acceptEvery, proposedRefs, withoutProposed } from './proposals';
import { preview, type MarksHandle } from './use-marks';
import { useSaveQueue } from './use-save-queue';

type Saving = {
  userId: string;
  runCode: string;
  photo: { id: string; fileName: string; widthPx: number; heightPx: number };
  plate: { id: string; version: number } | null;
};

/** Saves the marks of a photo by way of the queue on the device; asks first where some are only proposed. */
export function usePlateSaving({ userId, runCode, photo, plate }: Saving, handle: MarksHandle) {
  const router = useRouter();
  const { facts, size, state, proposal } = handle;
  const extent = { width: photo.widthPx, height: photo.heightPx };
  const queue = useSaveQueue(userId, ({ save, plate: saved }) => {
    if (save.photo.id !== photo.id) return;
    sayDone('The plate is saved.');
    router.push(`/plates/${saved.id}?photo=${photo.id}&saved=${saved.version}`);
    router.refresh();
  });
  const [asked, setAsked] = useState<number | null>(null);
  const whyNot = (marks: typeof state.marks) =>
    whatIsMissing(facts, marks) ?? preview(marks, extent, size)?.problems[0]?.message ?? null;
  const [own, all] = [withoutProposed(state.marks), acceptEvery(state.marks)];
  const open = proposedRefs(state.marks).length;
  const mine = queue.waiting.find((save) => save.photo.id === photo.id) ?? null;

  function send(withProposed: boolean) {
    setAsked(null);
    const body = requestOf(photo.id, facts, withProposed ? all : own, proposal);
    void queue.save({ runCode, photo: { id: photo.id, fileName: photo.fileName }, plate, body });
  }
  return {
    queue,
    asked,
    whyNotWithout: whyNot(own),
    whyNotWith: whyNot(all),
    /** Why nothing can be saved at all; proposals may still be accepted on the way. */
    missing:
      mine?.state === 'waiting' && !queue.busy
        ? 'These marks wait for the network already. They are sent by themselves.'
        : open > 0
          ? whyNot(all)
          : whyNot(own),
    errorOf: (path: string) =>
      mine?.state === 'refused' ? (mine.errors.find((one) => one.path === path)?.message ?? null) : null,
    save: () => (open > 0 ? setAsked(open) : send(false)),
    send,
    closeQuestion: () => setAsked(null),
  };
}
