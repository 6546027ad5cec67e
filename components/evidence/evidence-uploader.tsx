'use client';
import { useRef } from 'react';
import { type FileRejection, useDropzone } from 'react-dropzone';
import { Button } from '@/components/ui/button';
import { type EvidenceKind, kindFacts, largestBytes } from '@/lib/evidence/kinds';
import type { UploadAnswer } from '@/lib/evidence/schema';
import { UploadRow } from './upload-row';
import { useUploads } from './use-uploads';

export type EvidenceUploaderProps = {
  fractionCode?: string;
  runCode?: string;
  /** Left out: the server tells the kind from the bytes. */
  kind?: EvidenceKind;
  /** Once for each file that is stored (or was stored before). */
  onStored?: (answer: UploadAnswer) => void;
  /** Why nothing may be sent; the buttons stay and say so. */
  disabledReason?: string | null;
};

/** A hint to the file chooser only: what a file is, the server sees in its bytes. */
function acceptOf(kind: EvidenceKind | undefined): string | undefined {
  if (kind === 'plate-photo') return 'image/*';
  if (kind === 'gc-trace') return '.csv,.tsv,.txt,.cdf,.nc,.jdx,.dx,.jcamp';
  return undefined;
}

function refusal({ file, errors }: FileRejection, maxBytes: number) {
  const tooLarge = errors.some((error) => error.code === 'file-too-large');
  return {
    file,
    message: tooLarge
      ? `It is larger than ${maxBytes / 1024 / 1024} MB. Take a smaller photo or export.`
      : 'The browser could not open it. Choose it again.',
  };
}

/**
 * Sends files as evidence: camera, file chooser, or dropped onto it. The browser's file is sent as it is, so that the
 * stored bytes are the original ones.
 */
export function EvidenceUploader({
  fractionCode,
  runCode,
  kind,
  onStored,
  disabledReason,
}: EvidenceUploaderProps) {
  const { uploads, add, cancel, retry, remove } = useUploads({ fractionCode, runCode, kind }, (answer) =>
    onStored?.(answer),
  );
  const camera = useRef<HTMLInputElement>(null);
  const maxBytes = kind ? kindFacts[kind].maxBytes : largestBytes;
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    noClick: true,
    noKeyboard: true,
    disabled: Boolean(disabledReason),
    maxSize: maxBytes,
    onDrop: (accepted, rejected) =>
      add(
        accepted,
        rejected.map((one) => refusal(one, maxBytes)),
      ),
  });
  const what = kind ? kindFacts[kind].word : 'file';
  return (
    <div
      {...getRootProps({ role: 'group', tabIndex: undefined })}
      aria-label={`Send a ${what}`}
      className={`rounded-lg border-2 border-dashed px-4 py-4 ${isDragActive ? 'border-glass bg-glass-wash' : 'border-line-strong'}`}
    >
      <input
        {...getInputProps({ style: undefined, className: 'sr-only', tabIndex: -1 })}
        accept={acceptOf(kind)}
        aria-label={`Choose a ${what}`}
      />
      <input
        ref={camera}
        type="file"
        accept="image/*"
        capture="environment"
        className="sr-only"
        tabIndex={-1}
        aria-label="Take a photo"
        onChange={(event) => {
          add([...(event.target.files ?? [])]);
          event.target.value = '';
        }}
      />
      <div className="flex flex-wrap items-center gap-3">
        {kind === 'gc-trace' ? null : (
          <Button variant="primary" onClick={() => camera.current?.click()} disabledReason={disabledReason}>
            Take a photo
          </Button>
        )}
        <Button onClick={open} disabledReason={disabledReason}>
          Choose files
        </Button>
        <p className="text-sm text-ink-soft max-sm:hidden">
          {isDragActive ? 'Let go to send.' : 'or drop them here'}
        </p>
      </div>
      {uploads.length > 0 ? (
        <ul aria-label="Files being sent" className="mt-3 border-t border-line">
          {uploads.map((upload) => (
            <UploadRow
              key={upload.key}
              upload={upload}
              onCancel={() => cancel(upload.key)}
              onRetry={() => retry(upload.key)}
              onRemove={() => remove(upload.key)}
            />
          ))}
        </ul>
      ) : null}
      <p role="status" className="sr-only">
        {uploads.length > 0
          ? `${uploads.filter((one) => one.state === 'stored').length} of ${uploads.length} files stored`
          : null}
      </p>
    </div>
  );
}
