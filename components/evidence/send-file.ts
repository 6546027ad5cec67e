import type { EvidenceKind } from '@/lib/evidence/kinds';
import type { UploadAnswer } from '@/lib/evidence/schema';

export type Target = { fractionCode?: string; runCode?: string; kind?: EvidenceKind };
export type Sending = { done: Promise<UploadAnswer>; cancel: () => void };

/** Said when the sending was stopped by the person. */
export class Cancelled extends Error {}

function addressOf({ fractionCode, runCode, kind }: Target): string {
  const query = new URLSearchParams();
  if (fractionCode) query.set('fraction', fractionCode);
  if (runCode) query.set('run', runCode);
  if (kind) query.set('kind', kind);
  return `/api/v1/evidence?${query}`;
}

function problemOf(request: XMLHttpRequest): string {
  try {
    const { detail } = JSON.parse(request.responseText) as { detail?: string };
    if (detail) return detail;
  } catch {
    // Not ours: a proxy between.
  }
  return request.status === 413
    ? 'The file is too large for the server.'
    : `The server answered ${request.status}. Try again in a moment.`;
}

/**
 * Sends one file as it is. XMLHttpRequest, since fetch tells nothing about how much has gone out. `done` fails with
 * an Error in words for the person, or with Cancelled.
 */
export function sendFile(file: File, target: Target, onShare: (share: number) => void): Sending {
  const request = new XMLHttpRequest();
  const done = new Promise<UploadAnswer>((resolve, reject) => {
    request.open('POST', addressOf(target));
    request.setRequestHeader('Content-Type', 'application/octet-stream');
    request.setRequestHeader('X-Filename', `UTF-8''${encodeURIComponent(file.name)}`);
    request.upload.onprogress = (event) => event.lengthComputable && onShare(event.loaded / event.total);
    request.onload = () => {
      if (request.status >= 200 && request.status < 300)
        resolve(JSON.parse(request.responseText) as UploadAnswer);
      else reject(new Error(problemOf(request)));
    };
    request.onerror = () =>
      reject(
        new Error(
          'The connection broke off. The file is still on your device; try again when the network is back.',
        ),
      );
    request.onabort = () => reject(new Cancelled('Cancelled.'));
    request.send(file);
  });
  return { done, cancel: () => request.abort() };
}
