import { invalidField } from '@/lib/errors';
import { projectMarks } from './project-marks';
import type { PlateBody, PlateChange, PlatePhotoView, PlateView } from './schema';

type MarksOf = Pick<PlateBody, 'visualiser' | 'units' | 'corners' | 'baseline' | 'front' | 'lanes'>;

function subjectOf({ subject }: PlatePhotoView['lanes'][number]): PlateBody['lanes'][number]['subject'] {
  const { kind, code, compound } = subject;
  switch (kind) {
    case 'fraction':
      return { kind, code: code! };
    case 'reference':
      return { kind, compound: compound?.id };
    case 'co-spot':
      return { kind, code, compound: compound?.id };
    default:
      return { kind };
  }
}

/** The marks of one photo as they would be sent. */
export function marksOfPhoto(photo: PlatePhotoView): MarksOf {
  return {
    visualiser: photo.visualiser,
    units: photo.units,
    corners: photo.corners,
    baseline: photo.baseline,
    front: photo.front,
    lanes: photo.lanes.map((lane) => ({
      label: lane.label,
      x: lane.x ?? undefined,
      dilutionPercent: lane.dilutionPercent,
      subject: subjectOf(lane),
      spots: lane.spots.map(({ x, y, flags }) => ({
        x,
        y,
        shape: flags.includes('streak') ? 'streak' : 'spot',
      })),
    })),
  };
}

/**
 * The marks of a photo that is new to the plate as far as the plate knows them: the lines and lanes of the photo that
 * was marked last, carried over by the corners of both, still without spots.
 */
function sharedMarks(plate: PlateView, change: PlateChange): Partial<MarksOf> {
  if (!change.corners || change.units === 'mm') return {};
  const size = {
    widthMm: change.widthMm === undefined ? plate.widthMm : change.widthMm,
    heightMm: change.heightMm === undefined ? plate.heightMm : change.heightMm,
  };
  const latest = plate.photos.filter((photo) => photo.evidenceId === plate.evidenceId);
  for (const source of [...latest, ...plate.photos]) {
    const projected = projectMarks(source, change.corners, size);
    if (!projected) continue;
    const { baseline, front, laneX } = projected;
    const lanes = marksOfPhoto(source).lanes.map((lane, l) => ({
      ...lane,
      x: laneX[l] ?? undefined,
      spots: [],
    }));
    return { units: 'px', baseline, front, lanes };
  }
  return {};
}

/**
 * The whole of a plate after a change: what is left out stays. A photo that is new to the plate takes over lines and
 * lanes by its corners, or must come with all its marks; 422 otherwise.
 */
export function withChange(plate: PlateView, change: PlateChange): PlateBody {
  const evidenceId = change.evidenceId ?? plate.evidenceId;
  const photo = plate.photos.find((one) => one.evidenceId === evidenceId);
  const { stationaryPhase, eluent, widthMm, heightMm, note } = plate;
  const marks = photo ? marksOfPhoto(photo) : sharedMarks(plate, change);
  const given = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
  const whole = { stationaryPhase, eluent, widthMm, heightMm, note, ...marks, ...given, evidenceId };
  for (const key of ['visualiser', 'units', 'baseline', 'front', 'lanes'] as const) {
    if (!(key in whole))
      throw invalidField(
        key,
        `This photo is new to the plate: send its ${key} too, or its corners, if another photo of the plate has corners.`,
      );
  }
  return whole as PlateBody;
}
