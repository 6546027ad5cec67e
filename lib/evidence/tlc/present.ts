import type { Plate, PlateLane, PlatePhoto, PlateSpot } from '@/lib/database/records';
import { RF_METHOD_VERSION } from './rf';
import type { PlatePhotoView, PlateView } from './schema';

export type LoadedPlate = {
  plate: Plate;
  photos: PlatePhoto[];
  lanes: PlateLane[];
  spots: PlateSpot[];
  /** Codes of runs and fractions, names of compounds, by id. */
  codes: Map<string, string>;
  names: Map<string, string>;
};

function presentPhoto(photo: PlatePhoto, { lanes, spots, codes, names }: LoadedPlate): PlatePhotoView {
  return {
    id: photo.id,
    evidenceId: photo.evidenceId,
    visualiser: photo.visualiser,
    units: photo.units,
    corners: photo.corners,
    baseline: photo.baseline,
    front: photo.front,
    flags: photo.flags,
    lanes: lanes.map((lane, index) => ({
      id: lane.id,
      label: lane.label,
      x: photo.laneX[index] ?? null,
      subject: {
        kind: lane.subjectKind,
        ...(lane.fractionId && { code: codes.get(lane.fractionId)! }),
        ...(lane.compoundId && { compound: { id: lane.compoundId, name: names.get(lane.compoundId)! } }),
      },
      spots: spots
        .filter((spot) => spot.laneId === lane.id && spot.photoId === photo.id)
        .map(({ x, y, rf, rfUncertainty, flags }) => ({ x, y, rf, rfUncertainty, flags })),
    })),
  };
}

export function presentPlate(loaded: LoadedPlate): PlateView {
  const { plate } = loaded;
  const photos = loaded.photos.map((photo) => presentPhoto(photo, loaded));
  const times = loaded.photos.map((photo) => photo.updatedAt.getTime());
  const { evidenceId, visualiser, units, baseline, front, lanes } =
    photos[times.indexOf(Math.max(...times))]!;
  return {
    id: plate.id,
    run: loaded.codes.get(plate.runId)!,
    stationaryPhase: plate.stationaryPhase,
    eluent: plate.eluent,
    widthMm: plate.widthMm,
    heightMm: plate.heightMm,
    note: plate.note,
    evidenceId,
    visualiser,
    units,
    baseline,
    front,
    lanes,
    flags: [...new Set(photos.flatMap((photo) => photo.flags))],
    photos,
    methodVersion: RF_METHOD_VERSION,
    createdAt: plate.createdAt.toISOString(),
    updatedAt: plate.updatedAt.toISOString(),
    version: plate.version,
  };
}
