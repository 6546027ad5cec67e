import type { LaneSubject } from '@/lib/evidence/tlc/schema';

export type Point = { x: number; y: number };
export type Spot = Point & { shape: 'spot' | 'streak' };

/** What a lane holds, as it is edited; the name of a compound is kept beside its id for the eye. */
export type Subject = { kind: LaneSubject['kind']; code?: string; compound?: { id: string; name: string } };
export type Lane = { label: string; x: number; subject: Subject; spots: Spot[] };

/** All marks on one photo, in its pixels as shown. */
export type Marks = { baseline: Point[]; front: Point[]; lanes: Lane[] };

/** Names one mark. */
export type MarkRef =
  | { kind: 'baseline'; index: number }
  | { kind: 'front'; index: number }
  | { kind: 'lane'; lane: number }
  | { kind: 'spot'; lane: number; spot: number };

export const noMarks: Marks = { baseline: [], front: [], lanes: [] };
export const mostBaselinePoints = 2;
export const mostFrontPoints = 5;

export function sameRef(one: MarkRef | null, other: MarkRef | null): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}

/** Where a mark is; null when there is no such mark. A lane has only a place across the plate. */
export function placeOf(marks: Marks, ref: MarkRef): Point | null {
  if (ref.kind === 'lane') {
    const lane = marks.lanes[ref.lane];
    return lane ? { x: lane.x, y: 0 } : null;
  }
  if (ref.kind === 'spot') return marks.lanes[ref.lane]?.spots[ref.spot] ?? null;
  return marks[ref.kind][ref.index] ?? null;
}

/** The lane that lies nearest to a place across the plate, or -1 when there is none. */
export function nearestLane(marks: Marks, x: number): number {
  let best = -1;
  marks.lanes.forEach((lane, index) => {
    if (best < 0 || Math.abs(lane.x - x) < Math.abs(marks.lanes[best]!.x - x)) best = index;
  });
  return best;
}
