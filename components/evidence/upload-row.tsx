import { Button } from '@/components/ui/button';
import { Progress } from '@/components/ui/progress';
import { sizeText } from '@/lib/evidence/kinds';
import type { Upload, UploadState } from './use-uploads';

const words: Record<UploadState, string> = {
  waiting: 'waits its turn',
  sending: 'being sent',
  stored: 'stored',
  failed: 'not stored',
  cancelled: 'cancelled, not stored',
};

type UploadRowProps = { upload: Upload; onCancel: () => void; onRetry: () => void; onRemove: () => void };

/** One file on its way: how far it is, or what went wrong and what to do. */
export function UploadRow({ upload, onCancel, onRetry, onRemove }: UploadRowProps) {
  const { file, state, share, message } = upload;
  const again = state === 'failed' || state === 'cancelled';
  const detail =
    state === 'sending' && share >= 1
      ? 'sent; the server checks it …'
      : `${Math.round(share * 100)} % of ${sizeText(file.size)}`;
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-line py-2">
      <div className="min-w-0 flex-1 basis-56">
        {state === 'sending' ? (
          <Progress label={file.name} share={share >= 1 ? null : share} detail={detail} />
        ) : (
          <p className="flex flex-wrap items-baseline justify-between gap-x-4">
            <span className="min-w-0 truncate">{file.name}</span>
            <span className={state === 'failed' ? 'font-bold text-fails' : 'font-bold'}>{words[state]}</span>
          </p>
        )}
        {message ? (
          <p role={state === 'failed' ? 'alert' : undefined} className="max-w-prose text-sm text-ink-soft">
            {message}
          </p>
        ) : null}
      </div>
      <div className="flex gap-2">
        {state === 'sending' || state === 'waiting' ? (
          <Button onClick={onCancel} aria-label={`Cancel ${file.name}`}>
            Cancel
          </Button>
        ) : null}
        {again ? (
          <Button onClick={onRetry} aria-label={`Try ${file.name} again`}>
            Try again
          </Button>
        ) : null}
        {again || state === 'stored' ? (
          <Button variant="quiet" onClick={onRemove} aria-label={`Take ${file.name} off this list`}>
            Clear
          </Button>
        ) : null}
      </div>
    </li>
  );
}
