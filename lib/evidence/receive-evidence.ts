import type { Actor } from '@/lib/auth/actor';
import { recorded } from '@/lib/audit/recorded';
import type { EvidenceFile } from '@/lib/database/records';
import { invalidField, Problem } from '@/lib/errors';
import { putSpooledFile } from '@/storage/put-object';
import type { SpooledFile } from '@/storage/spool-file';
import type { Destination } from './find-destination';
import { type EvidenceKind, isHeicType, isPhotoType, kindFacts, mayBeKind, usualKindOf } from './kinds';
import { inspectHeic } from './inspect-heic';
import { inspectPhoto, type PhotoSize } from './photo-decoder';
import { runAfterStored } from './registry';
import { sniffType } from './sniff-type';
import { writeEvidenceRow } from './write-evidence-row';

export type ReceivedFile = {
  file: SpooledFile;
  fileName: string;
  /** What the sender says it is; left out: what the bytes usually are. */
  kind?: EvidenceKind;
  takenAt?: Date | null;
};

export type EvidenceFacts = {
  kind: EvidenceKind;
  mediaType: string;
  photo: PhotoSize | null;
};

export type Received = {
  evidence: EvidenceFile;
  /** False when the same bytes were there already. */
  isNew: boolean;
  tray: { id: string; reason: string } | null;
  notes: string[];
};

function requireKind(mediaType: string, wanted: EvidenceKind | undefined): EvidenceKind {
  const usual = usualKindOf(mediaType);
  if (!usual) throw new Problem('unsupported-type', `Files of type ${mediaType} are not taken.`);
  if (!wanted || mayBeKind(mediaType, wanted)) return wanted ?? usual;
  throw invalidField(
    'kind',
    `The bytes are ${mediaType}, which is no ${kindFacts[wanted].word}. Check the file, or leave the kind out.`,
  );
}

async function inspect({ file, kind: wanted }: ReceivedFile): Promise<EvidenceFacts> {
  const mediaType = await sniffType(file.path, file.byteLength);
  const kind = requireKind(mediaType, wanted);
  const { maxBytes, word } = kindFacts[kind];
  if (file.byteLength > maxBytes) {
    throw new Problem('too-large', `A ${word} may have ${maxBytes / 1024 / 1024} MB. Send a smaller one.`);
  }
  if (!isPhotoType(mediaType)) return { kind, mediaType, photo: null };
  const inspectKind = isHeicType(mediaType) ? inspectHeic : inspectPhoto;
  return { kind, mediaType, photo: await inspectKind(file.path) };
}

/**
 * Keeps a spooled file as evidence: looks at its bytes, puts them into the store, and only then writes the row and
 * its audit event, so that a crash leaves at most an object without a row. The same bytes for the same fraction, run
 * or tray again give the record that is there. The caller discards the spooled file. Throws 413, 415 or 422.
 */
export async function receiveEvidence(
  actor: Actor,
  destination: Destination,
  given: ReceivedFile,
): Promise<Received> {
  const facts = await inspect(given);
  await putSpooledFile(given.file, facts.mediaType);
  const written = await recorded(actor, (recorder) => writeEvidenceRow(recorder, destination, given, facts));
  return { ...written, notes: await runAfterStored(actor, written.evidence) };
}
