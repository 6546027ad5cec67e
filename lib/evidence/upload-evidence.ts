import type { Actor } from '@/lib/auth/actor';
import { answerOnce } from '@/lib/http/answer-once';
import { findDestination } from './find-destination';
import { presentUpload, uploadStatus } from './present';
import { readUpload } from './read-upload';
import { receiveEvidence } from './receive-evidence';
import { placesOf } from './require-evidence';
import type { UploadQuery } from './schema';

/**
 * One upload from request to answer. Where the file goes is decided first, so that nobody without the right makes
 * the server read their bytes; an Idempotency-Key counts for the bytes by their digest.
 */
export async function uploadEvidence(actor: Actor, query: UploadQuery, request: Request): Promise<Response> {
  const destination = await findDestination(actor, query);
  const upload = await readUpload(request, query.kind);
  try {
    const identity = JSON.stringify({ sha256: upload.file.sha256Hex, fileName: upload.fileName });
    return await answerOnce(request, actor, identity, async () => {
      const takenAt = query.takenAt ? new Date(query.takenAt) : null;
      const received = await receiveEvidence(actor, destination, { ...upload, kind: query.kind, takenAt });
      const places = (await placesOf([received.evidence])).get(received.evidence.id)!;
      return Response.json(presentUpload(received, places), {
        status: uploadStatus(received),
        headers: { location: `/api/v1/evidence/${received.evidence.id}`, 'cache-control': 'no-store' },
      });
    });
  } finally {
    await upload.file.discard();
  }
}
