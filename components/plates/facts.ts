import type { PlateInput, PlatePhotoView, PlateView } from '@/lib/evidence/tlc/schema';
import type { PlateSize } from '@/lib/evidence/tlc/plate-frame';
import type { Lane, Marks, Point, Subject } from './marks';
import type { Proposal } from './proposals';

/** What is written beside a plate; texts as they are typed. */
export type Facts = {
  stationaryPhase: string;
  eluent: string;
  visualiser: string;
  widthMm: string;
  heightMm: string;
  note: string;
};

export const noFacts: Facts = {
  stationaryPhase: '',
  eluent: '',
  visualiser: 'uv-254',
  widthMm: '',
  heightMm: '',
  note: '',
};

const textOf = (value: number | null) => (value === null ? '' : String(value));

export function factsOf(plate: PlateView, photo: PlatePhotoView | null): Facts {
  return {
    stationaryPhase: plate.stationaryPhase,
    eluent: plate.eluent,
    visualiser: photo?.visualiser ?? 'uv-254',
    widthMm: textOf(plate.widthMm),
    heightMm: textOf(plate.heightMm),
    note: plate.note ?? '',
  };
}

/** Marks of a saved photo for editing. Marks in millimetres belong to no place in the photo, so they give none. */
export function marksOf(photo: PlatePhotoView, widthPx: number): Marks {
  const inPhoto = photo.units === 'px';
  const lanes = photo.lanes.map((lane, index): Lane => {
    const spots = lane.spots.map(({ x, y, flags }) => ({
      x,
      y,
      shape: flags.includes('streak') ? ('streak' as const) : ('spot' as const),
    }));
    const evenly = (widthPx * (index + 1)) / (photo.lanes.length + 1);
    return {
      label: lane.label,
      x: inPhoto ? (lane.x ?? spots[0]?.x ?? evenly) : evenly,
      subject: lane.subject,
      dilutionPercent: textOf(lane.dilutionPercent),
      spots: inPhoto ? spots : [],
    };
  });
  return {
    // Corners are in pixels whatever the units of the marks.
    corners: photo.corners ?? [],
    baseline: inPhoto ? photo.baseline : [],
    front: inPhoto ? photo.front : [],
    lanes,
  };
}

/** The lanes of a plate for a further photo of it: what was spotted is the same, where it lies in the photo is not. */
export function lanesForNewPhoto(plate: PlateView, widthPx: number): Marks {
  const empty = { ...plate.photos[0]!, corners: null, units: 'mm' as const };
  return marksOf(empty, widthPx);
}

function subjectToSend({ kind, code, compound }: Subject): PlateInput['lanes'][number]['subject'] {
  switch (kind) {
    case 'fraction':
      return { kind, code: code ?? '' };
    case 'reference':
      return { kind, compound: compound?.id };
    case 'co-spot':
      return { kind, code: code || undefined, compound: compound?.id };
    case null:
      throw new RangeError('What a lane holds must be said before it is sent.');
    default:
      return { kind };
  }
}

/** Whether a lane may hold a diluted sample, to compare the others with. */
export function mayBeDiluted({ kind }: Pick<Subject, 'kind'>): boolean {
  return kind === 'reference' || kind === 'crude';
}

/** A typed size as a number; null for an empty field, NaN for what is none. A decimal comma is taken too. */
export function readSize(text: string): number | null {
  const plain = text.trim().replace(',', '.');
  return plain === '' ? null : Number(plain);
}

/** The size of the plate as far as it was typed and makes sense. */
export function sizeOf({ widthMm, heightMm }: Pick<Facts, 'widthMm' | 'heightMm'>): PlateSize {
  const read = (text: string) => {
    const size = readSize(text);
    return size !== null && size > 0 && size <= 500 ? size : null;
  };
  return { widthMm: read(widthMm), heightMm: read(heightMm) };
}

const bare = ({ x, y }: Point): Point => ({ x, y });

/** The request body of facts and marks, none of which is a mere proposal; what was proposed goes along for the record. */
export function requestOf(
  evidenceId: string,
  facts: Facts,
  marks: Marks,
  proposal: Proposal | null = null,
): PlateInput {
  return {
    evidenceId,
    stationaryPhase: facts.stationaryPhase.trim(),
    eluent: facts.eluent.trim(),
    visualiser: facts.visualiser,
    widthMm: readSize(facts.widthMm),
    heightMm: readSize(facts.heightMm),
    note: facts.note.trim() || null,
    units: 'px',
    corners: marks.corners.length === 4 ? marks.corners.map(bare) : null,
    baseline: marks.baseline.map(bare),
    front: marks.front.map(bare),
    lanes: marks.lanes.map(({ label, x, subject, dilutionPercent, spots }) => ({
      label,
      x,
      subject: subjectToSend(subject),
      dilutionPercent: mayBeDiluted(subject) ? readSize(dilutionPercent) : null,
      spots: spots.map(({ shape, ...place }) => ({ ...bare(place), shape })),
    })),
    ...(proposal && { proposal }),
  };
}

/** What is still missing before it can be saved, in the order in which it is done; null when nothing is. */
export function whatIsMissing(facts: Facts, marks: Marks): string | null {
  if (marks.corners.length > 0 && marks.corners.length < 4)
    return 'Mark all four corners of the plate, or take away those that are there.';
  if (marks.baseline.length < 2) return 'Mark the baseline by two points.';
  if (marks.front.length < 2) return 'Mark the solvent front by two to five points.';
  if (marks.lanes.length === 0) return 'Mark at least one lane.';
  for (const lane of marks.lanes) {
    if (lane.label.trim() === '') return 'Give each lane a label.';
    if (!lane.subject.kind) return `Say what lane ${lane.label} holds.`;
    if (lane.subject.kind === 'fraction' && !lane.subject.code)
      return `Say which fraction lane ${lane.label} holds.`;
    const dilution = mayBeDiluted(lane.subject) ? readSize(lane.dilutionPercent) : null;
    if (dilution !== null && !(dilution > 0 && dilution <= 100))
      return `The dilution of lane ${lane.label} must be a number of per cent from 0 to 100, or empty.`;
  }
  if (facts.stationaryPhase.trim() === '') return 'Enter the stationary phase.';
  if (facts.eluent.trim() === '') return 'Enter the eluent.';
  for (const [name, text] of [
    ['width', facts.widthMm],
    ['height', facts.heightMm],
  ] as const) {
    const size = readSize(text);
    if (size !== null && !(size > 0 && size <= 500))
      return `The plate's ${name} must be a number of mm up to 500, or empty.`;
  }
  return null;
}
