import type { PlateProposal } from '@/lib/evidence/tlc/proposal-schema';
import { acceptedMark, type Extent, newLane, within } from './edit-marks';
import { everyRef, type Lane, markAt, type MarkPoint, type MarkRef, type Marks, nearestLane } from './marks';

/** What the server proposed for a photo, as it was answered. */
export type Proposal = PlateProposal;

/** A proposed spot nearer than this share of the photo's width to one that is marked is the same spot. */
const SAME_SPOT_SHARE = 0.02;
/** A proposed lane nearer than this share of the photo's width to one that is marked is the same lane. */
const SAME_LANE_SHARE = 0.03;

/** Proposed marks that nobody has accepted, in the order of Tab. */
export function proposedRefs(marks: Marks): MarkRef[] {
  return everyRef(marks).filter((ref) => markAt(marks, ref)?.proposed !== undefined);
}

/** The marks without what is only proposed: what may be saved. */
export function withoutProposed(marks: Marks): Marks {
  const own = <T extends { proposed?: number }>(list: readonly T[]) =>
    list.filter((one) => one.proposed === undefined);
  return {
    corners: own(marks.corners),
    baseline: own(marks.baseline),
    front: own(marks.front),
    lanes: own(marks.lanes).map((lane) => ({ ...lane, spots: own(lane.spots) })),
  };
}

export function acceptEvery(marks: Marks): Marks {
  const all = <T extends { proposed?: number }>(list: readonly T[]) => list.map(acceptedMark);
  return {
    corners: all(marks.corners),
    baseline: all(marks.baseline),
    front: all(marks.front),
    lanes: all(marks.lanes).map((lane) => ({ ...lane, spots: all(lane.spots) })),
  };
}

/**
 * Adds what was proposed to the marks, as proposals. What a person marked stays: lines and corners are proposed only
 * where there are none, and spots only where none is marked. Earlier proposals give way.
 */
export function propose(before: Marks, proposal: Proposal, extent: Extent): Marks {
  const marks = withoutProposed(before);
  const sure = proposal.confidence ?? 0;
  const points = (own: MarkPoint[], found: readonly { x: number; y: number }[]): MarkPoint[] =>
    own.length > 0 ? own : found.map((point) => ({ ...within(point, extent), proposed: sure }));
  const lanes: Lane[] = marks.lanes.map((lane) => ({ ...lane, spots: [...lane.spots] }));
  for (const found of proposal.lanes) {
    const { x } = within({ x: found.x, y: 0 }, extent);
    const near = nearestLane(marks, x);
    const same = near >= 0 && Math.abs(lanes[near]!.x - x) < SAME_LANE_SHARE * extent.width;
    const spotSure = found.spots.map((spot) => spot.confidence ?? sure);
    const lane = same ? lanes[near]! : { ...newLane({ lanes }, x), proposed: Math.max(...spotSure, sure) };
    if (!same) lanes.push(lane);
    found.spots.forEach((spot, index) => {
      const place = within(spot, extent);
      const isThere = lane.spots.some(
        (own) => Math.hypot(own.x - place.x, own.y - place.y) < SAME_SPOT_SHARE * extent.width,
      );
      if (!isThere) lane.spots.push({ ...place, shape: spot.shape ?? 'spot', proposed: spotSure[index]! });
    });
  }
  return {
    corners: points(marks.corners, proposal.corners.length === 4 ? proposal.corners : []),
    baseline: points(marks.baseline, proposal.baseline),
    front: points(marks.front, proposal.front),
    lanes,
  };
}

/** "fairly sure, 78 %": how sure a proposal is, in a word and in per cent. */
export function confidenceWords(confidence: number): string {
  const word = confidence >= 0.85 ? 'sure' : confidence >= 0.6 ? 'fairly sure' : 'not sure';
  return `${word}, ${Math.round(100 * confidence)} %`;
}
