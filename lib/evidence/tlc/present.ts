import type { Plate, PlateLane, PlatePhoto, PlateSpot } from '@/lib/database/records';
import { compareBeforeAfter, type PlateCompound } from './before-after';
import { compareLanes } from './compare-lanes';
import { mergeSightings } from './merge-sightings';
import { photoGeometry, type PhotoGeometry } from './photo-geometry';
import { presentProposal } from './present-proposal';
import { plateXOfLane } from './project-marks';
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
  /** Target and known impurities of the run. */
  compounds: PlateCompound[];
};

type Placed = { photo: PlatePhoto; geometry: PhotoGeometry | null };
type LaneView = PlatePhotoView['lanes'][number];

/** Where a place on the plate lies in the other photos that have corners. */
function presentProjections(
  on: { x: number; y: number } | null,
  own: Placed,
  placed: Placed[],
): LaneView['spots'][number]['projections'] {
  if (!on) return [];
  return placed.flatMap(({ photo, geometry }) => {
    if (photo === own.photo || geometry?.unit !== own.geometry?.unit) return [];
    const at = geometry?.toPixels?.(on) ?? null;
    return at ? [{ evidenceId: photo.evidenceId, ...at }] : [];
  });
}

function presentSpot(spot: PlateSpot, own: Placed, placed: Placed[]): LaneView['spots'][number] {
  const { x, y, rf, rfUncertainty, flags } = spot;
  const on = own.geometry?.toPlate({ x, y }) ?? null;
  const projections = presentProjections(on, own, placed);
  const [plateX, plateY] = [on?.x ?? null, on?.y ?? null];
  return { x, y, rf, hRf: 100 * rf, rfUncertainty, flags, plateX, plateY, projections };
}

function presentLane(
  lane: PlateLane,
  index: number,
  own: Placed,
  placed: Placed[],
  { spots, codes, names }: LoadedPlate,
): LaneView {
  const x = own.photo.laneX[index] ?? null;
  return {
    id: lane.id,
    label: lane.label,
    x,
    plateX: own.geometry && plateXOfLane(own.photo, { x, spots: [] }, own.geometry),
    dilutionPercent: lane.dilutionPercent,
    subject: {
      kind: lane.subjectKind,
      ...(lane.fractionId && { code: codes.get(lane.fractionId)! }),
      ...(lane.compoundId && { compound: { id: lane.compoundId, name: names.get(lane.compoundId)! } }),
    },
    spots: spots
      .filter((spot) => spot.laneId === lane.id && spot.photoId === own.photo.id)
      .map((spot) => presentSpot(spot, own, placed)),
  };
}

function presentPhoto(own: Placed, placed: Placed[], loaded: LoadedPlate): PlatePhotoView {
  const { photo, geometry } = own;
  const lanes = loaded.lanes.map((lane, index) => presentLane(lane, index, own, placed, loaded));
  return {
    id: photo.id,
    evidenceId: photo.evidenceId,
    visualiser: photo.visualiser,
    units: photo.units,
    corners: photo.corners,
    baseline: photo.baseline,
    front: photo.front,
    flags: photo.flags,
    lanes,
    plateUnit: geometry?.unit ?? null,
    comparisons: compareLanes(lanes),
    beforeAfter: compareBeforeAfter(lanes, photo.visualiser, loaded.compounds),
    proposal: presentProposal(photo.proposal, { ...photo.get(), lanes }),
  };
}

/** The spots of each lane over all photos, each spot once. */
function presentDistinct(photos: PlatePhotoView[], lanes: PlateLane[]): PlateView['distinctSpots'] {
  return lanes.map((lane, l) => ({
    laneId: lane.id,
    label: lane.label,
    spots: mergeSightings(
      photos.flatMap(({ id, evidenceId, visualiser, lanes: seen }) =>
        seen[l]!.spots.map(({ rf, rfUncertainty }, index) => ({
          photoId: id,
          evidenceId,
          visualiser,
          index,
          rf,
          rfUncertainty,
        })),
      ),
    ),
  }));
}

export function presentPlate(loaded: LoadedPlate): PlateView {
  const { plate } = loaded;
  const placed = loaded.photos.map((photo): Placed => ({ photo, geometry: photoGeometry(photo, plate) }));
  const photos = placed.map((own) => presentPhoto(own, placed, loaded));
  const times = loaded.photos.map((photo) => photo.updatedAt.getTime());
  const { evidenceId, visualiser, units, corners, baseline, front, lanes } =
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
    corners,
    baseline,
    front,
    lanes,
    distinctSpots: presentDistinct(photos, loaded.lanes),
    flags: [...new Set(photos.flatMap((photo) => photo.flags))],
    photos,
    methodVersion: RF_METHOD_VERSION,
    createdAt: plate.createdAt.toISOString(),
    updatedAt: plate.updatedAt.toISOString(),
    version: plate.version,
  };
}
