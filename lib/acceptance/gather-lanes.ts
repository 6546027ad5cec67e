import type { Transaction } from 'sequelize';
import { Plate, PlateLane, PlatePhoto, PlateSpot } from '@/lib/database/records';
import type { LaneInput, SpotInput } from './judge-inputs';

type LoadedPlate = Plate & { photos: PlatePhoto[]; lanes: (PlateLane & { spots: PlateSpot[] })[] };

function spotsIn(lane: PlateLane & { spots: PlateSpot[] }, photoId: string): SpotInput[] {
  return lane.spots
    .filter((spot) => spot.photoId === photoId)
    .sort((a, b) => a.position - b.position)
    .map(({ rf, rfUncertainty, flags }) => ({ rf, rfUncertainty, flags }));
}

/** The lanes of a fraction as each photo of their plates shows them, oldest first. */
export async function gatherLanes(fractionId: string, transaction?: Transaction): Promise<LaneInput[]> {
  const own = await PlateLane.findAll({ where: { fractionId }, transaction });
  const plates = (await Plate.findAll({
    where: { id: own.map((lane) => lane.plateId) },
    include: [
      { model: PlatePhoto, as: 'photos' },
      { model: PlateLane, as: 'lanes', include: [{ model: PlateSpot, as: 'spots' }] },
    ],
    order: [['id', 'ASC']],
    transaction,
  })) as LoadedPlate[];
  return plates.flatMap((plate) =>
    [...plate.photos]
      .sort((a, b) => a.id.localeCompare(b.id))
      .flatMap((photo) =>
        plate.lanes
          .filter((lane) => lane.fractionId === fractionId && lane.subjectKind === 'fraction')
          .sort((a, b) => a.position - b.position)
          .map((lane) => ({
            plateId: plate.id,
            photoId: photo.id,
            visualiserId: photo.visualiser,
            laneLabel: lane.label,
            spots: spotsIn(lane, photo.id),
            references: plate.lanes
              .filter((other) => other.subjectKind === 'reference' && other.compoundId !== null)
              .map((other) => ({ compoundId: other.compoundId as string, spots: spotsIn(other, photo.id) })),
          })),
      ),
  );
}
