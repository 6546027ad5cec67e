import type { TokenActor, UserActor } from '@/lib/auth/actor';
import type { EvidenceFile } from '@/lib/database/records';
import { findDestination } from '@/lib/evidence/find-destination';
import type { EvidenceKind } from '@/lib/evidence/kinds';
import { receiveEvidence } from '@/lib/evidence/receive-evidence';
import { spoolFile } from '@/storage/spool-file';

export interface DemoFile {
  bytes: Buffer;
  fileName: string;
  kind: EvidenceKind;
  takenAt: Date;
}

async function* once(bytes: Buffer): AsyncGenerator<Uint8Array> {
  yield bytes;
}

/** Sends a file as a person or an instrument would. The same bytes at the same place again give what is there. */
export async function sendFile(
  sender: UserActor | TokenActor,
  place: { fraction?: string; run?: string },
  { bytes, ...given }: DemoFile,
): Promise<EvidenceFile> {
  const destination = await findDestination(sender, place);
  const file = await spoolFile(once(bytes));
  try {
    return (await receiveEvidence(sender, destination, { file, ...given })).evidence;
  } finally {
    await file.discard();
  }
}
