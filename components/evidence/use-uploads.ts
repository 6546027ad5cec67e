'use client';
import { useCallback, useEffect, useRef, useState } from 'react';
import type { UploadAnswer } from '@/lib/evidence/schema';
import { Cancelled, sendFile, type Sending, type Target } from './send-file';

export type UploadState = 'waiting' | 'sending' | 'stored' | 'failed' | 'cancelled';
export type Upload = {
  key: number;
  file: File;
  state: UploadState;
  /** Of the bytes that went out; at 1 the server is still looking at them. */
  share: number;
  message: string | null;
};

/** Several files, sent one after the other; each can be cancelled and tried again by itself. */
export function useUploads(target: Target, onStored: (answer: UploadAnswer) => void) {
  const [uploads, setUploads] = useState<Upload[]>([]);
  const nextKey = useRef(1);
  const sending = useRef<{ key: number; job: Sending } | null>(null);
  const latest = useRef({ target, onStored });
  useEffect(() => {
    latest.current = { target, onStored };
  });

  const change = useCallback((key: number, part: Partial<Upload>) => {
    setUploads((all) => all.map((one) => (one.key === key ? { ...one, ...part } : one)));
  }, []);

  useEffect(() => {
    const next = uploads.find((one) => one.state === 'waiting');
    if (!next || sending.current) return;
    const job = sendFile(next.file, latest.current.target, (share) => change(next.key, { share }));
    sending.current = { key: next.key, job };
    job.done
      .then((answer) => {
        const note = answer.notes?.join(' ') ?? null;
        sending.current = null;
        change(next.key, { state: 'stored', share: 1, message: note });
        latest.current.onStored(answer);
      })
      .catch((error: Error) => {
        sending.current = null;
        change(next.key, {
          state: error instanceof Cancelled ? 'cancelled' : 'failed',
          message: error.message,
        });
      });
    // The state "sending" is set after the job exists, so that a cancel always finds it.
    queueMicrotask(() => change(next.key, { state: 'sending', share: 0, message: null }));
  }, [uploads, change]);

  useEffect(() => () => sending.current?.job.cancel(), []);

  const add = useCallback((files: readonly File[], refused: { file: File; message: string }[] = []) => {
    const fresh = files.map((file) => ({
      key: nextKey.current++,
      file,
      state: 'waiting' as const,
      share: 0,
      message: null,
    }));
    const bad = refused.map(({ file, message }) => ({
      key: nextKey.current++,
      file,
      state: 'failed' as const,
      share: 0,
      message,
    }));
    setUploads((all) => [...all, ...fresh, ...bad]);
  }, []);
  const cancel = (key: number) => {
    if (sending.current?.key === key) sending.current.job.cancel();
    else change(key, { state: 'cancelled', message: 'Cancelled.' });
  };
  const retry = (key: number) => change(key, { state: 'waiting', share: 0, message: null });
  const remove = (key: number) => setUploads((all) => all.filter((one) => one.key !== key));
  return { uploads, add, cancel, retry, remove };
}
