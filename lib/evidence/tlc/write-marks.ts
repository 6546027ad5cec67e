import type { Transaction } from 'sequelize';
import { newId } from '@/lib/database/ids';
import { type Plate, PlateLane, PlatePhoto, PlateSpot } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';
import type { CheckedMarks } from './check-marks';
import type { ResolvedSubject } from './resolve-subjects';
import type { PlateBody } from './schema';

type Written = { body: PlateBody; checked: CheckedMarks; subjects: ResolvedSubject[] };

async function writePhoto(plate: Plate, { body, checked }: Written, transaction: Transaction) {
  const fields = {
    visualiser: body.visualiser,
    units: body.units,
    corners: body.corners ?? null,
    baseline: body.baseline,
    front: body.front,
    laneX: checked.lanes.map((lane) => lane.x),
    flags: checked.flags,
    // What was proposed stays on record when marks change later without a new proposal.
    ...(body.proposal && { proposal: body.proposal }),
  };
  const known = await PlatePhoto.findOne({
    where: { plateId: plate.id, evidenceId: body.evidenceId },
    transaction,
  });
  if (known) {
    known.changed('updatedAt', true);
    return known.update({ ...fields, updatedAt: new Date() }, { transaction });
  }
  return PlatePhoto.create(
    { id: newId(), plateId: plate.id, evidenceId: body.evidenceId, ...fields },
    { transaction },
  );
}

/** Lanes are the plate's, spots are the photo's: a lane can only go when no other photo has a spot on it. */
async function writeLanes(
  plate: Plate,
  { body, subjects }: Written,
  photoId: string,
  transaction: Transaction,
) {
  const present = await PlateLane.findAll({
    where: { plateId: plate.id },
    order: [['position', 'ASC']],
    transaction,
  });
  await PlateSpot.destroy({ where: { laneId: present.map((lane) => lane.id), photoId }, transaction });
  const gone = present.slice(body.lanes.length);
  if (gone.length > 0) {
    const left = await PlateSpot.count({ where: { laneId: gone.map((lane) => lane.id) }, transaction });
    if (left > 0)
      throw invalidField(
        'lanes',
        `Lane ${gone[0]!.label} has spots on another photo of this plate. Remove those first, then the lane.`,
      );
    await PlateLane.destroy({ where: { id: gone.map((lane) => lane.id) }, transaction });
  }
  const lanes: PlateLane[] = [];
  for (const [position, { label, dilutionPercent }] of body.lanes.entries()) {
    const fields = {
      position,
      label,
      dilutionPercent: dilutionPercent ?? null,
      ...subjects[position]!,
    };
    const lane = present[position];
    lanes.push(
      lane
        ? await lane.update(fields, { transaction })
        : await PlateLane.create({ id: newId(), plateId: plate.id, ...fields }, { transaction }),
    );
  }
  return lanes;
}

/** Writes the marks of one photo of a plate in place of those that it had. The caller records what changed. */
export async function writeMarks(plate: Plate, written: Written, transaction: Transaction): Promise<void> {
  const photo = await writePhoto(plate, written, transaction);
  const lanes = await writeLanes(plate, written, photo.id, transaction);
  const spots = written.body.lanes.flatMap((lane, l) =>
    lane.spots.map((spot, position) => {
      const { rf, rfUncertainty, flags } = written.checked.lanes[l]!.spots[position]!;
      return {
        id: newId(),
        laneId: lanes[l]!.id,
        photoId: photo.id,
        position,
        x: spot.x,
        y: spot.y,
        rf,
        rfUncertainty,
        flags,
      };
    }),
  );
  // Not bulkCreate with JSON columns: their setters run on instances only.
  for (const spot of spots) await PlateSpot.create(spot, { transaction });
}
