import type { Recorder } from '@/lib/audit/recorded';
import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { newId } from '@/lib/database/ids';
import { EvidenceFile, Fraction, Group, Run, TrayItem } from '@/lib/database/records';
import { whyNotInState } from '@/lib/distillation/fraction-states';
import { notFound, Problem } from '@/lib/errors';
import type { Destination } from './find-destination';
import { kindFacts } from './kinds';
import type { EvidenceFacts, Received, ReceivedFile } from './receive-evidence';

type Written = Omit<Received, 'notes'>;

/** Locks what the file belongs to, so that two senders of the same bytes come one after the other. */
async function lockDestination(
  { transaction }: Recorder,
  destination: Destination,
): Promise<Fraction | null> {
  const locked = { transaction, lock: transaction.LOCK.UPDATE };
  if (destination.kind === 'fraction') {
    // The row will refer to the run: it is locked first, as everybody does, so that no two wait crosswise.
    await Run.findByPk(destination.runId, { transaction, lock: transaction.LOCK.SHARE });
    const fraction = await Fraction.findOne({ where: { code: destination.fractionCode }, ...locked });
    if (!fraction) throw notFound(`fraction ${destination.fractionCode}`);
    return fraction;
  }
  if (destination.kind === 'run') await Run.findByPk(destination.runId, locked);
  else await Group.findByPk(destination.groupId, locked);
  return null;
}

async function findSame(
  { transaction }: Recorder,
  destination: Destination,
  fraction: Fraction | null,
  sha256: string,
): Promise<Written | null> {
  const { groupId } = destination;
  if (destination.kind !== 'tray') {
    const runId = destination.runId;
    const evidence = await EvidenceFile.findOne({
      where: { groupId, sha256, fractionId: fraction?.id ?? null, ...(fraction ? {} : { runId }) },
      transaction,
    });
    return evidence && { evidence, isNew: false, tray: null };
  }
  const item = (await TrayItem.findOne({
    where: { groupId, filedAt: null, askedFor: destination.askedFor },
    include: [{ model: EvidenceFile, as: 'evidence', where: { sha256 }, required: true }],
    transaction,
  })) as (TrayItem & { evidence: EvidenceFile }) | null;
  return item && { evidence: item.evidence, isNew: false, tray: { id: item.id, reason: item.reason } };
}

async function createRow(
  { transaction, actor, record }: Recorder,
  destination: Destination,
  fraction: Fraction | null,
  { file, fileName, takenAt }: ReceivedFile,
  { kind, mediaType, photo }: EvidenceFacts,
): Promise<EvidenceFile> {
  if (actor.kind === 'system') throw new Error('Evidence is sent by a person or by an instrument.');
  const evidence = await EvidenceFile.create(
    {
      id: newId(),
      groupId: destination.groupId,
      runId: destination.kind === 'tray' ? null : destination.runId,
      fractionId: fraction?.id ?? null,
      kind,
      sha256: file.sha256Hex,
      sizeBytes: file.byteLength,
      mediaType,
      fileName,
      widthPx: photo?.widthPx ?? null,
      heightPx: photo?.heightPx ?? null,
      takenAt: takenAt ?? null,
      sentByKind: actor.kind,
      sentById: actor.kind === 'user' ? actor.userId : actor.tokenId,
      sentByName: actor.name.slice(0, 160),
    },
    { transaction },
  );
  record({
    type: 'evidence.uploaded',
    recordType: 'evidence',
    recordId: evidence.id,
    groupId: evidence.groupId,
    after: {
      fileName,
      kind,
      mediaType,
      sha256: evidence.sha256,
      sizeBytes: file.byteLength,
      fraction: fraction?.code ?? null,
      runId: evidence.runId,
    },
  });
  return evidence;
}

async function layInTray(
  { transaction, actor, record }: Recorder,
  { askedFor, reason, groupId }: Destination & { kind: 'tray' },
  evidence: EvidenceFile,
): Promise<{ id: string; reason: string }> {
  const item = await TrayItem.create(
    {
      id: newId(),
      groupId,
      evidenceId: evidence.id,
      instrumentId: actor.kind === 'token' ? actor.instrumentId : null,
      askedFor,
      reason,
    },
    { transaction },
  );
  record({
    type: 'tray.received',
    recordType: 'tray item',
    recordId: item.id,
    groupId,
    after: { evidenceId: evidence.id, fileName: evidence.fileName, askedFor },
    reason,
  });
  return { id: item.id, reason };
}

/** Writes the row of a stored file with its audit event, and its place: fraction, run or tray. */
export async function writeEvidenceRow(
  recorder: Recorder,
  destination: Destination,
  given: ReceivedFile,
  facts: EvidenceFacts,
): Promise<Written> {
  const fraction = await lockDestination(recorder, destination);
  const same = await findSame(recorder, destination, fraction, given.file.sha256Hex);
  if (same) return same;
  if (fraction) {
    const why = whyNotInState('change', fraction.status);
    if (why) throw new Problem('state-conflict', why);
  }
  const evidence = await createRow(recorder, destination, fraction, given, facts);
  if (fraction) await fractionChanged(recorder, fraction, `${kindFacts[facts.kind].word} added`);
  const tray = destination.kind === 'tray' ? await layInTray(recorder, destination, evidence) : null;
  return { evidence, isNew: true, tray };
}
