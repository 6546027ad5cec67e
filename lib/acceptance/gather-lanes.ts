import type { Transaction } from 'sequelize';
import { Plate, PlateLane, PlatePhoto, PlateSpot } from '@/lib/database/records';
import { mergeSightings } from '@/lib/evidence/tlc/merge-sightings';
import type { LaneInput, SpotInput } from './judge-inputs';

type LoadedPlate = Plate & { photos: PlatePhoto[]; lanes: (PlateLane & { spots: PlateSpot[] })[] };

function spotsIn(lane: PlateLane & { spots: PlateSpot[] }, photoId: string): SpotInput[] {
  return lane.spots
    .filter((spot) => spot.photoId === photoId)
    .sort((a, b) => a.position - b.position)
    .map(({ rf, rfUncertainty, flags }) => ({ rf, rfUncertainty, flags }));
}

/** Spots of a lane that only other photos of the plate show. */
function spotsElsewhere(
  lane: PlateLane & { spots: PlateSpot[] },
  photo: PlatePhoto,
  photos: PlatePhoto[],
): NonNullable<LaneInput['elsewhere']> {
  const sightings = photos.flatMap(({ id, evidenceId, visualiser }) =>
    spotsIn(lane, id).map(({ rf, rfUncertainty }, index) => ({
      photoId: id,
      evidenceId,
      visualiser,
      index,
      rf,
      rfUncertainty,
    })),
  );
  const isCorrected = (id: string) =>
    !photos.find((one) => one.id === id)?.flags.includes('perspective not corrected');
  return mergeSightings(sightings)
    .filter(({ seenIn }) => seenIn.every((one) => one.photoId !== photo.id))
    .map(({ rf, seenIn }) => ({
      rf,
      visualiserIds: [...new Set(seenIn.map((one) => one.visualiser))],
      perspectiveCorrected: [photo.id, ...seenIn.map((one) => one.photoId)].every(isCorrected),
    }));
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
            elsewhere: spotsElsewhere(lane, photo, plate.photos),
            references: plate.lanes
              .filter((other) => other.subjectKind === 'reference' && other.compoundId !== null)
              .map((other) => ({ compoundId: other.compoundId as string, spots: spotsIn(other, photo.id) })),
          })),
      ),
  );
}
