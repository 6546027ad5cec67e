import { measureOnPlate } from './measure-on-plate';
import { framePlate } from './plate-frame';
import type { Point } from './polyline';
import { computeRf, flagsOfPhoto, type RfFlag } from './rf';

export type MarkedSpot = Point & { shape?: 'spot' | 'streak' };
export type MarkedLane = { x?: number | null; spots: readonly MarkedSpot[] };

/** Marks on one photo, all in the same units. `extent` is the size of the photo (px) or the plate (mm), if known. */
export type Marks = {
  units: 'px' | 'mm';
  baseline: readonly Point[];
  front: readonly Point[];
  lanes: readonly MarkedLane[];
  extent?: { width: number; height: number };
  /**
   * Corners of the plate in pixels of the photo, top left, top right, bottom right, bottom left. With them marks in
   * pixels are measured on the plate, free of perspective.
   */
  corners?: readonly Point[] | null;
  /** Size of the plate; with corners and both sizes everything is in millimetres. */
  widthMm?: number | null;
  heightMm?: number | null;
};

export type MeasuredSpot = { rf: number; rfUncertainty: number; flags: RfFlag[] };
export type MarkProblem = { path: string; message: string };

export type Measured = {
  /** In the order of the marks; null where that spot has a problem. */
  lanes: { x: number | null; spots: (MeasuredSpot | null)[] }[];
  flags: RfFlag[];
  problems: MarkProblem[];
};

function laneX(lane: MarkedLane): number | null {
  if (typeof lane.x === 'number') return lane.x;
  if (lane.spots.length === 0) return null;
  return lane.spots.reduce((sum, spot) => sum + spot.x, 0) / lane.spots.length;
}

/** Checks the two lines at a lane that has no spot, by a spot of no importance halfway between them. */
function checkEmptyLane(marks: Marks, x: number) {
  const middle = [...marks.baseline, ...marks.front];
  const y = middle.reduce((sum, point) => sum + point.y, 0) / Math.max(1, middle.length);
  return computeRf({ ...marks, spot: { x, y } });
}

function measureAsDrawn(marks: Marks): Measured {
  const problems: MarkProblem[] = [];
  const flags = new Set<RfFlag>();
  const say = (path: string, message: string) => {
    if (!problems.some((one) => one.path === path && one.message === message))
      problems.push({ path, message });
  };
  const lanes = marks.lanes.map((lane, l) => {
    const x = laneX(lane);
    if (x !== null && marks.extent && (x < 0 || x > marks.extent.width))
      say(`lanes.${l}.x`, 'The lane lies off the plate: mark it again.');
    const spots = lane.spots.map((spot, s) => {
      const result = computeRf({ ...marks, spot: { x: spot.x, y: spot.y }, shape: spot.shape });
      if (!result.ok) {
        say(result.field === 'spot' ? `lanes.${l}.spots.${s}` : result.field, result.problem);
        return null;
      }
      for (const flag of result.flags) if (flagsOfPhoto.includes(flag)) flags.add(flag);
      return { rf: result.rf, rfUncertainty: result.rfUncertainty, flags: result.flags };
    });
    if (spots.length === 0 && x !== null) {
      const result = checkEmptyLane(marks, x);
      if (result.ok) for (const flag of result.flags) if (flagsOfPhoto.includes(flag)) flags.add(flag);
      if (!result.ok && result.field !== 'spot') say(result.field, result.problem);
    }
    return { x, spots };
  });
  return { lanes, flags: [...flags], problems };
}

/**
 * Rf, its uncertainty and the flags of every spot, from the same sums as on the server, so that the page can show
 * them while marking. Problems name the mark by its path in the request. Pure; throws nothing.
 */
export function measureMarks(marks: Marks): Measured {
  if (!marks.corners) return measureAsDrawn(marks);
  const framed = framePlate(marks.corners, marks);
  if (!framed.ok) {
    const problem = { path: 'corners', message: framed.problem };
    const lanes = marks.lanes.map((lane) => ({ x: laneX(lane), spots: lane.spots.map(() => null) }));
    return { lanes, flags: [], problems: [problem] };
  }
  return marks.units === 'mm' ? measureAsDrawn(marks) : measureOnPlate(marks, framed.frame);
}
