import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { type Plate, PlateLane, Run } from '@/lib/database/records';
import { notFound } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';
import { auditFacts } from './audit-facts';
import { loadPlate } from './load-plate';
import { putMarks, requirePerson, tellFractions } from './mark-plate';
import { remeasurePhotos } from './remeasure-photos';
import { requirePlate, requirePlateForChange } from './require-plate';
import { withChange } from './with-change';
import type { PlateBody, PlateChange, PlateView } from './schema';

/** The fields of the plate itself. Its version counts on even when only spots moved. */
async function updatePlate(
  plate: Plate,
  body: PlateBody,
  personId: string,
  transaction: import('sequelize').Transaction,
): Promise<void> {
  plate.set({
    stationaryPhase: body.stationaryPhase,
    eluent: body.eluent,
    widthMm: body.widthMm ?? null,
    heightMm: body.heightMm ?? null,
    note: body.note ?? null,
    markedById: personId,
  });
  plate.changed('markedById', true);
  await plate.save({ transaction });
}

/**
 * Replaces the marks of one photo of a plate; a photo that the plate did not have yet is added to it. `version` is
 * what the caller saw: 409 when the plate has moved on. Before and after stand in the audit trail.
 */
export async function changePlate(
  actor: Actor,
  id: string,
  version: number,
  change: PlateChange,
): Promise<PlateView> {
  const seen = await requirePlate(actor, id);
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    // Run, then plate, then fractions: everybody locks in this order.
    const run = await Run.findByPk(seen.runId, { transaction, lock: transaction.LOCK.UPDATE });
    if (!run) throw notFound('plate with this id');
    const plate = await requirePlateForChange(actor, id, transaction);
    authorise(actor, 'plate.write', plate.groupId);
    requireSameVersion(plate, version);
    const before = await loadPlate(plate, transaction);
    const body = withChange(before, change);
    const lanes = await PlateLane.findAll({ where: { plateId: id }, transaction });
    const namedBefore = lanes.map((lane) => lane.fractionId).filter((fraction) => fraction !== null);
    await updatePlate(plate, body, requirePerson(actor), transaction);
    const fractions = await putMarks(recorder, run, plate, body, namedBefore);
    await remeasurePhotos(before, body, plate, transaction);
    const view = await loadPlate(plate, transaction);
    record({
      type: 'plate.changed',
      recordType: 'plate',
      recordId: id,
      groupId: plate.groupId,
      before: auditFacts(before),
      after: auditFacts(view),
    });
    await tellFractions(recorder, fractions, 'plate marks changed');
    return view;
  });
}
