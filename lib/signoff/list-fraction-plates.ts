import type { Transaction } from 'sequelize';
import { Plate, PlateLane, PlatePhoto, PlateSpot } from '@/lib/database/records';

export type FractionPlate = Plate & { photos: PlatePhoto[]; lanes: (PlateLane & { spots: PlateSpot[] })[] };

/** The plates that have a lane of the fraction, with all their photos and only its lanes, in a fixed order. */
export async function listFractionPlates(
  fractionId: string,
  transaction?: Transaction,
): Promise<FractionPlate[]> {
  const lanes = await PlateLane.findAll({ where: { fractionId }, transaction });
  const plates = (await Plate.findAll({
    where: { id: lanes.map((lane) => lane.plateId) },
    include: [
      { model: PlatePhoto, as: 'photos' },
      {
        model: PlateLane,
        as: 'lanes',
        where: { fractionId },
        include: [{ model: PlateSpot, as: 'spots' }],
      },
    ],
    order: [['id', 'ASC']],
    transaction,
  })) as FractionPlate[];
  for (const plate of plates) {
    plate.photos.sort((a, b) => a.id.localeCompare(b.id));
    plate.lanes.sort((a, b) => a.position - b.position);
    for (const lane of plate.lanes)
      lane.spots.sort((a, b) => a.photoId.localeCompare(b.photoId) || a.position - b.position);
  }
  return plates;
}
