import { invalidField } from '@/lib/errors';
import type { PlateBody, PlateChange, PlatePhotoView, PlateView } from './schema';

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
function marksOf(
  photo: PlatePhotoView,
): Pick<PlateBody, 'visualiser' | 'units' | 'baseline' | 'front' | 'lanes'> {
  return {
    visualiser: photo.visualiser,
    units: photo.units,
    baseline: photo.baseline,
    front: photo.front,
    lanes: photo.lanes.map((lane) => ({
      label: lane.label,
      x: lane.x ?? undefined,
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
 * The whole of a plate after a change: what is left out stays. A photo that is new to the plate must come with all its
 * marks; 422 otherwise.
 */
export function withChange(plate: PlateView, change: PlateChange): PlateBody {
  const evidenceId = change.evidenceId ?? plate.evidenceId;
  const photo = plate.photos.find((one) => one.evidenceId === evidenceId);
  const { stationaryPhase, eluent, widthMm, heightMm, note } = plate;
  const marks = photo ? marksOf(photo) : {};
  const given = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
  const whole = { stationaryPhase, eluent, widthMm, heightMm, note, ...marks, ...given, evidenceId };
  for (const key of ['visualiser', 'units', 'baseline', 'front', 'lanes'] as const) {
    if (!(key in whole)) throw invalidField(key, `This photo is new to the plate: send its ${key} too.`);
  }
  return whole as PlateBody;
}
