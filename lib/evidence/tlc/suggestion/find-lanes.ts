import type { FoundSpot } from './find-spots';

export type FoundLane = { x: number; spots: FoundSpot[] };

/** Spots nearer than this share of the plate's width, across, are in one lane in any case. */
const SAME_LANE = 0.012;
/** Spots within this share of the usual distance between lanes are in one lane. */
const OF_PITCH = 0.38;

/**
 * Sorts spots into lanes: spots one above the other first, then whatever lies within a good third of the usual
 * distance between lanes. Lanes without a spot come from marks on the baseline (x of each). From left to right;
 * the spots of each from the front down.
 */
export function findLanes(spots: readonly FoundSpot[], marks: readonly number[], width: number): FoundLane[] {
  let lanes = cluster(
    [...spots].sort((a, b) => a.x - b.x),
    SAME_LANE * width,
  );
  const pitch = usualPitch(marks.length > 1 ? [...marks] : lanes.map((lane) => lane.x), width);
  lanes = cluster(
    lanes.flatMap((lane) => lane.spots).sort((a, b) => a.x - b.x),
    Math.max(SAME_LANE * width, OF_PITCH * pitch),
  );
  for (const x of marks) {
    const near = lanes.find((lane) => Math.abs(lane.x - x) < Math.max(0.45 * pitch, SAME_LANE * width));
    if (!near) lanes.push({ x, spots: [] });
  }
  for (const lane of lanes) lane.spots.sort((a, b) => a.y - b.y);
  return lanes.sort((a, b) => a.x - b.x);
}

function cluster(sorted: readonly FoundSpot[], gap: number): FoundLane[] {
  const lanes: FoundLane[] = [];
  for (const spot of sorted) {
    const lane = lanes.at(-1);
    if (lane && spot.x - lane.x < gap) {
      lane.spots.push(spot);
      lane.x = lane.spots.reduce((sum, s) => sum + s.x, 0) / lane.spots.length;
    } else {
      lanes.push({ x: spot.x, spots: [spot] });
    }
  }
  return lanes;
}

/** The middle distance between neighbours that are not nearly one; 0 if there is none. */
function usualPitch(places: number[], width: number): number {
  const sorted = places.sort((a, b) => a - b);
  const gaps = sorted
    .slice(1)
    .map((x, i) => x - sorted[i]!)
    .filter((gap) => gap > 0.022 * width)
    .sort((a, b) => a - b);
  return gaps.length > 0 ? gaps[(gaps.length - 1) >> 1]! : 0;
}
