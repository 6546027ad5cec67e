import { applyHomography, findHomography, plateCornersMm } from '@/lib/evidence/tlc/homography';
import type { Point } from '@/lib/evidence/tlc/polyline';
import { computeRf } from '@/lib/evidence/tlc/rf';
import type { PlateSuggestion } from '@/lib/evidence/tlc/suggestion/suggestion';
import type { PlateTruth } from './render-plate';

export type Tally = {
  plates: number;
  blankPlates: number;
  /** Spots whose contrast is at least three standard deviations of one pixel's noise. */
  spotsAboveNoise: number;
  found: number;
  rfWithinHundredth: number;
  largestRfError: number;
  falseSpots: number;
  falseOnBlank: number;
  /** Lanes with a spot above the noise or a mark at the origin, and those proposed within 2 mm. */
  lanes: number;
  lanesFound: number;
  falseLanes: number;
  cornerErrorsMm: number[];
};

export const ABOVE_NOISE = 3;
/** A proposal this near to a true spot is of that spot, mm. */
const SAME_SPOT_MM = 2;

export function newTally(): Tally {
  return {
    plates: 0,
    blankPlates: 0,
    spotsAboveNoise: 0,
    found: 0,
    rfWithinHundredth: 0,
    largestRfError: 0,
    falseSpots: 0,
    falseOnBlank: 0,
    lanes: 0,
    lanesFound: 0,
    falseLanes: 0,
    cornerErrorsMm: [],
  };
}

/**
 * Accepts a suggestion as it stands: its own corners carry its lines and spots to millimetres, and Rf comes from
 * there by the sums that the server applies to a chemist's marks. What came out is added to the tally; answers
 * what went wrong, for the output.
 */
export function judge(
  suggestion: PlateSuggestion,
  truth: PlateTruth,
  { widthMm, heightMm, originMarks }: { widthMm: number; heightMm: number; originMarks?: boolean },
  tally: Tally,
) {
  const notes: string[] = [];
  const toMm = (corners: readonly Point[]) => {
    const found = findHomography(corners, plateCornersMm(widthMm, heightMm));
    if (!found.ok) throw new Error(found.problem);
    return (p: Point) => applyHomography(found.matrix, p);
  };
  const own = toMm(suggestion.corners);
  const real = toMm(truth.corners);
  truth.corners.forEach((corner, i) => {
    const at = real(suggestion.corners[i]!);
    const should = real(corner);
    tally.cornerErrorsMm.push(Math.hypot(at.x - should.x, at.y - should.y));
  });
  const lines = { baseline: suggestion.baseline.map(own), front: suggestion.front.map(own) };
  const proposed = suggestion.lanes
    .flatMap((lane) => lane.spots)
    .map((spot) => ({ spot, mm: real(spot), used: false }));
  const trueSpots = truth.lanes.flatMap((lane) => lane.spots);
  tally.plates += 1;
  judgeLanes(suggestion, truth, real, originMarks, tally);
  for (const spot of [...trueSpots].sort((a, b) => b.contrastToNoise - a.contrastToNoise)) {
    const at = real(spot);
    const distance = (p: Point) => Math.hypot(p.x - at.x, p.y - at.y);
    const near = proposed.filter((one) => !one.used).sort((a, b) => distance(a.mm) - distance(b.mm))[0];
    const hit = near && distance(near.mm) < SAME_SPOT_MM ? near : null;
    if (hit) hit.used = true;
    if (spot.contrastToNoise < ABOVE_NOISE) continue;
    tally.spotsAboveNoise += 1;
    if (!hit) {
      notes.push(`missed Rf ${spot.rf.toFixed(2)} at ${spot.contrastToNoise.toFixed(1)} times the noise`);
      continue;
    }
    tally.found += 1;
    const measured = computeRf({ spot: own(hit.spot), ...lines, units: 'mm' });
    const error = measured.ok ? Math.abs(measured.rf - spot.rf) : Infinity;
    if (error <= 0.01) tally.rfWithinHundredth += 1;
    else notes.push(`Rf off by ${error.toFixed(3)}`);
    tally.largestRfError = Math.max(tally.largestRfError, error);
  }
  const wrong = proposed.filter((one) => !one.used);
  for (const { spot } of wrong) notes.push(`false spot at ${spot.x.toFixed(0)}, ${spot.y.toFixed(0)}`);
  tally.falseSpots += wrong.length;
  if (trueSpots.length === 0) {
    tally.blankPlates += 1;
    tally.falseOnBlank += wrong.length;
  }
  return notes;
}

function judgeLanes(
  suggestion: PlateSuggestion,
  truth: PlateTruth,
  toMm: (p: Point) => Point,
  originMarks: boolean | undefined,
  tally: Tally,
) {
  const proposed = suggestion.lanes.map((lane) => lane.x);
  const near = (x: number, lane: { x: number; y: number }) =>
    Math.abs(toMm({ x, y: lane.y }).x - toMm(lane).x) < SAME_SPOT_MM;
  for (const lane of truth.lanes) {
    if (!originMarks && !lane.spots.some((spot) => spot.contrastToNoise >= ABOVE_NOISE)) continue;
    tally.lanes += 1;
    if (proposed.some((x) => near(x, lane))) tally.lanesFound += 1;
  }
  tally.falseLanes += proposed.filter((x) => !truth.lanes.some((lane) => near(x, lane))).length;
}
