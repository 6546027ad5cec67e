import type { EvidenceFile } from '@/lib/database/records';
import { isPhotoType } from './kinds';
import type { Received } from './receive-evidence';
import type { EvidencePlaces } from './require-evidence';
import type { EvidenceAnswer, EvidenceView, UploadAnswer } from './schema';

export function presentEvidence(file: EvidenceFile, places: EvidencePlaces): EvidenceView {
  return {
    id: file.id,
    kind: file.kind,
    sha256: file.sha256,
    sizeBytes: Number(file.sizeBytes),
    mediaType: file.mediaType,
    fileName: file.fileName,
    widthPx: file.widthPx,
    heightPx: file.heightPx,
    takenAt: file.takenAt?.toISOString() ?? null,
    fraction: places.fraction,
    run: places.run,
    sentBy: { kind: file.sentByKind, name: file.sentByName },
    createdAt: file.createdAt.toISOString(),
    version: file.version,
  };
}

export function presentEvidenceAnswer(file: EvidenceFile, places: EvidencePlaces): EvidenceAnswer {
  const self = `/api/v1/evidence/${file.id}`;
  return {
    evidence: presentEvidence(file, places),
    links: {
      self,
      content: `${self}/content`,
      ...(isPhotoType(file.mediaType) && { preview: `${self}/preview` }),
    },
  };
}

export function presentUpload({ evidence, tray, notes }: Received, places: EvidencePlaces): UploadAnswer {
  return {
    ...presentEvidenceAnswer(evidence, places),
    ...(tray && { tray }),
    ...(notes.length > 0 && { notes }),
  };
}

/** 201 for a new file, 200 for one that is there already, 202 for one that waits in the tray. */
export function uploadStatus({ isNew, tray }: Received): number {
  if (tray) return 202;
  return isNew ? 201 : 200;
}
