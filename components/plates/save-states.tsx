'use client';
import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { SaveQueue } from './use-save-queue';

type SaveStatesProps = {
  queue: SaveQueue;
  /** The photo that is open, whose marks are "these". */ photoId?: string;
};

/** What has become of saved marks: waiting for the network, sent, or refused and why. */
export function SaveStates({ queue, photoId }: SaveStatesProps) {
  const nameOf = (photo: { id: string; fileName: string }) =>
    photo.id === photoId ? 'these marks' : `the marks on ${photo.fileName}`;
  return (
    <div className="flex flex-col gap-3 empty:hidden">
      {queue.waiting.map((save) =>
        save.state === 'waiting' && (save.words === null || queue.busy) ? null : (
          <Notice
            key={save.id}
            kind={save.state === 'waiting' ? 'needs you' : 'fails'}
            title={
              save.state === 'waiting'
                ? `Waiting for the network: ${nameOf(save.photo)}`
                : `Refused: ${nameOf(save.photo)}`
            }
            live
            action={
              <div className="flex flex-wrap gap-2">
                <Button onClick={() => void queue.tryAgain(save)}>
                  {save.state === 'waiting' ? 'Try now' : 'Send them again'}
                </Button>
                {save.state === 'refused' ? (
                  <Button onClick={() => void queue.discard(save)}>Do not send them</Button>
                ) : null}
              </div>
            }
          >
            {save.words}{' '}
            {save.state === 'waiting'
              ? 'They are kept on this device and sent by themselves, once, when the network is back.'
              : 'Nothing was saved. The marks are still on this device: change them and save again.'}
          </Notice>
        ),
      )}
      {queue.sent
        .filter(({ save }) => save.photo.id !== photoId)
        .map(({ save, plate }) => (
          <Notice
            key={save.id}
            title={`Sent: ${nameOf(save.photo)}`}
            live
            action={
              <Link className="link" href={`/plates/${plate.id}?photo=${save.photo.id}`}>
                Look at the plate
              </Link>
            }
          >
            They had waited for the network and are saved now.
          </Notice>
        ))}
    </div>
  );
}
