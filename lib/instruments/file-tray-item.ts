import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { type Recorder, recorded } from '@/lib/audit/recorded';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { EvidenceFile, type Fraction, Run, TrayItem } from '@/lib/database/records';
import { whyNotInState } from '@/lib/distillation/fraction-states';
import { requireFraction, requireFractionForChange } from '@/lib/distillation/require-fraction';
import { invalidField, notFound, Problem } from '@/lib/errors';
import { kindFacts } from '@/lib/evidence/kinds';
import { runAfterStored } from '@/lib/evidence/registry';
import { placesOf } from '@/lib/evidence/require-evidence';
import { presentTrayItem } from './present-tray-item';
import type { FiledView } from './tray-schema';

async function requireWaiting(actor: Actor, id: string, { transaction }: Recorder): Promise<TrayItem> {
  const item = await TrayItem.findOne({
    where: { id, groupId: visibleGroupIds(actor) },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!item) throw notFound('file with this id in the tray');
  authorise(actor, 'tray.file', item.groupId);
  if (item.filedAt)
    throw new Problem(
      'state-conflict',
      'This file has left the tray already. Reload the tray to see what waits.',
    );
  return item;
}

async function requireRoomFor(
  fraction: Fraction,
  item: TrayItem,
  evidence: EvidenceFile,
  { transaction }: Recorder,
): Promise<void> {
  if (fraction.groupId !== item.groupId)
    throw invalidField(
      'fraction',
      `${fraction.code} belongs to another group than the instrument that sent the file.`,
    );
  const why = whyNotInState('change', fraction.status);
  if (why) throw new Problem('state-conflict', why);
  const same = await EvidenceFile.findOne({
    where: { fractionId: fraction.id, sha256: evidence.sha256 },
    transaction,
  });
  if (same)
    throw new Problem(
      'already-exists',
      `${fraction.code} has the very same file already, as ${same.fileName}. Choose another fraction, or leave it in the tray.`,
    );
}

/**
 * Gives a file of the tray its fraction. 404 for an item or fraction that the actor may not see, 403 without the
 * role, 409 when it was filed already or the fraction has the same bytes.
 */
export async function fileTrayItem(actor: Actor, id: string, fractionCode: string): Promise<FiledView> {
  const { runId } = await requireFraction(actor, fractionCode);
  const { item, evidence } = await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    await Run.findByPk(runId, { transaction, lock: transaction.LOCK.SHARE });
    const fraction = await requireFractionForChange(actor, fractionCode, transaction);
    const item = await requireWaiting(actor, id, recorder);
    const evidence = await EvidenceFile.findByPk(item.evidenceId, { transaction, rejectOnEmpty: true });
    await requireRoomFor(fraction, item, evidence, recorder);
    await evidence.update({ fractionId: fraction.id, runId: fraction.runId }, { transaction });
    const filedById = actor.kind === 'user' ? actor.userId : null;
    await item.update({ filedAt: new Date(), filedById, fractionId: fraction.id }, { transaction });
    record({
      type: 'tray.filed',
      recordType: 'evidence',
      recordId: evidence.id,
      groupId: item.groupId,
      before: { fraction: null, askedFor: item.askedFor },
      after: {
        fraction: fraction.code,
        trayItemId: item.id,
        fileName: evidence.fileName,
        sha256: evidence.sha256,
      },
    });
    await fractionChanged(recorder, fraction, `${kindFacts[evidence.kind].word} taken from the tray`);
    return { item, evidence };
  });
  const notes = await runAfterStored(actor, evidence);
  const places = (await placesOf([evidence])).get(evidence.id)!;
  return { ...presentTrayItem(item, evidence, places, null), ...(notes.length > 0 && { notes }) };
}
