import type { Recorder } from '@/lib/audit/recorded';
import { EvidenceFile, type Run, TrayItem } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';

/**
 * The photo that is to be marked, its row locked: a plate photo of the run's group that belongs to no other run. One
 * that belonged to none becomes the run's, and leaves the tray. 422 otherwise.
 */
export async function requirePlatePhoto(
  recorder: Recorder,
  run: Run,
  evidenceId: string,
): Promise<EvidenceFile> {
  const { transaction, record, actor } = recorder;
  const photo = await EvidenceFile.findOne({
    where: { id: evidenceId, groupId: run.groupId },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!photo)
    throw invalidField('evidenceId', 'There is no such file in the group of this run. Send the photo first.');
  if (photo.kind !== 'plate-photo')
    throw invalidField('evidenceId', 'This file is no plate photo. Send it again with ?kind=plate-photo.');
  if (photo.runId === run.id) return photo;
  if (photo.runId !== null)
    throw invalidField('evidenceId', `This photo belongs to another run. Send it for the run ${run.code}.`);
  await photo.update({ runId: run.id }, { transaction });
  const item = await TrayItem.findOne({ where: { evidenceId, filedAt: null }, transaction });
  await item?.update(
    { filedAt: new Date(), filedById: actor.kind === 'user' ? actor.userId : null },
    { transaction },
  );
  record({
    type: 'evidence.attached',
    recordType: 'evidence',
    recordId: photo.id,
    groupId: photo.groupId,
    before: { runId: null },
    after: { runId: run.id, run: run.code },
  });
  return photo;
}
