import type { LaneSubject } from '@/lib/evidence/tlc/schema';

export type Point = { x: number; y: number };
/** A mark that was proposed and that nobody has accepted or moved yet carries the confidence in it, 0 to 1. */
export type Proposable = { proposed?: number };
export type MarkPoint = Point & Proposable;
export type Spot = MarkPoint & { shape: 'spot' | 'streak' };

/**
 * What a lane holds, as it is edited; the name of a compound is kept beside its id for the eye. Null until a person has
 * said it: a lane is never taken for something by default.
 */
export type Subject = {
  kind: LaneSubject['kind'] | null;
  code?: string;
  compound?: { id: string; name: string };
};
/** `x` is where the lane crosses the baseline, px; `dilutionPercent` is text as it is typed. */
export type Lane = Proposable & {
  label: string;
  x: number;
  subject: Subject;
  dilutionPercent: string;
  spots: Spot[];
};

/** All marks on one photo, in its pixels as shown. Corners: top left, top right, bottom right, bottom left. */
export type Marks = { corners: MarkPoint[]; baseline: MarkPoint[]; front: MarkPoint[]; lanes: Lane[] };

export type PointKind = 'corner' | 'baseline' | 'front';
/** Names one mark. */
export type MarkRef =
  | { kind: PointKind; index: number }
  | { kind: 'lane'; lane: number }
  | { kind: 'spot'; lane: number; spot: number };

export const noMarks: Marks = { corners: [], baseline: [], front: [], lanes: [] };
/** The list of marks in which points of a kind stand. */
export const listOf = { corner: 'corners', baseline: 'baseline', front: 'front' } as const;
/** How many points a hand may set; a proposal may bend the baseline too. */
export const mostPoints = { corner: 4, baseline: 2, front: 5 } as const;

export function sameRef(one: MarkRef | null, other: MarkRef | null): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}

/** The mark of a name; null when there is none. A lane has only a place across the plate. */
export function markAt(marks: Marks, ref: MarkRef): MarkPoint | null {
  if (ref.kind === 'lane') {
    const lane = marks.lanes[ref.lane];
    return lane ? { x: lane.x, y: 0, proposed: lane.proposed } : null;
  }
  if (ref.kind === 'spot') return marks.lanes[ref.lane]?.spots[ref.spot] ?? null;
  return marks[listOf[ref.kind]][ref.index] ?? null;
}

/** Every mark there is, in the order in which Tab goes through them. */
export function everyRef(marks: Marks): MarkRef[] {
  const points = (['corner', 'baseline', 'front'] as const).flatMap((kind) =>
    marks[listOf[kind]].map((_point, index): MarkRef => ({ kind, index })),
  );
  const lanes = marks.lanes.flatMap((lane, l): MarkRef[] => [
    { kind: 'lane', lane: l },
    ...lane.spots.map((_spot, s): MarkRef => ({ kind: 'spot', lane: l, spot: s })),
  ]);
  return [...points, ...lanes];
}

/** The lane whose foot is nearest to a place across the plate, or -1 when there is none. */
export function nearestLane(marks: Pick<Marks, 'lanes'>, x: number): number {
  let best = -1;
  marks.lanes.forEach((lane, index) => {
    if (best < 0 || Math.abs(lane.x - x) < Math.abs(marks.lanes[best]!.x - x)) best = index;
  });
  return best;
}
