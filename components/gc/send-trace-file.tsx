'use client';
import { useState } from 'react';
import { useDropzone } from 'react-dropzone';
import { failureOf } from '@/components/runs/problems-of';
import { buttonClass } from '@/components/ui/button-class';
import { Notice } from '@/components/ui/notice';
import { Progress } from '@/components/ui/progress';
import { ApiError } from '@/lib/http/client';

type SendTraceFileProps = {
  fractionCode: string;
  onSent: (evidence: { id: string; fileName: string }) => void;
};
type Answer = { evidence?: { id: string; fileName: string }; detail?: string };

/** Sends the bytes as they are, telling how far they are: fetch cannot, so this is an XMLHttpRequest. */
function send(fractionCode: string, file: File, onProgress: (share: number) => void) {
  return new Promise<{ id: string; fileName: string }>((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', `/api/v1/evidence?fraction=${encodeURIComponent(fractionCode)}&kind=gc-trace`);
    request.setRequestHeader('Content-Type', file.type || 'application/octet-stream');
    request.setRequestHeader('X-Filename', encodeURIComponent(file.name));
    request.upload.onprogress = (event) => event.lengthComputable && onProgress(event.loaded / event.total);
    request.onerror = () =>
      reject(
        new ApiError(0, 'The server cannot be reached. Choose the file again when the network is back.'),
      );
    request.onload = () => {
      const answer = JSON.parse(request.responseText || '{}') as Answer;
      if (request.status < 300 && answer.evidence) resolve(answer.evidence);
      else reject(new ApiError(request.status, answer.detail ?? 'The file was not taken. Try again.'));
    };
    request.send(file);
  });
}

/** Takes a trace file by drag and drop or from the disk, and stores it as evidence of the fraction. */
export function SendTraceFile({ fractionCode, onSent }: SendTraceFileProps) {
  const [under, setUnder] = useState<{ name: string; share: number } | null>(null);
  const [failure, setFailure] = useState<string | null>(null);
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    multiple: false,
    noClick: true,
    noKeyboard: true,
    onDrop: async ([file]) => {
      if (!file || under) return;
      setFailure(null);
      setUnder({ name: file.name, share: 0 });
      try {
        onSent(await send(fractionCode, file, (share) => setUnder({ name: file.name, share })));
      } catch (error) {
        setFailure(failureOf(error));
      } finally {
        setUnder(null);
      }
    },
  });
  return (
    <div
      {...getRootProps()}
      className={`flex flex-col items-start gap-3 rounded-lg border border-dashed p-5 ${
        isDragActive ? 'border-glass bg-glass-wash' : 'border-line-strong'
      }`}
    >
      <input
        {...getInputProps({
          style: undefined,
          className: 'sr-only',
          'aria-label': 'Trace file',
          tabIndex: -1,
        })}
      />
      <p>Drop a table of time and signal here (CSV or TSV), or take it from this device.</p>
      <button type="button" onClick={open} className={buttonClass('secondary')}>
        Choose a file
      </button>
      {under ? (
        <div className="w-full">
          <Progress label={`Sending ${under.name}`} share={under.share < 1 ? under.share : null} />
        </div>
      ) : null}
      {failure ? <Notice kind="fails" live title={failure} /> : null}
    </div>
  );
}
