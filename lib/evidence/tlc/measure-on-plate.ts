import { carryMarks } from './carry-marks';
import type { MarkProblem, Marks, Measured } from './measure-marks';
import type { PlateFrame } from './plate-frame';
import type { Point } from './polyline';
import {
  computeRf,
  DEFAULT_MARK_UNCERTAINTY_MM,
  DEFAULT_MARK_UNCERTAINTY_SHARE,
  flagsOfPhoto,
  type RfFlag,
} from './rf';

/** How far beyond the marked edge a mark may lie: twice the uncertainty of placing a mark. */
export function edgeMargin(frame: Pick<PlateFrame, 'unit'>): number {
  return 2 * (frame.unit === 'mm' ? DEFAULT_MARK_UNCERTAINTY_MM : DEFAULT_MARK_UNCERTAINTY_SHARE);
}

function isOff(point: Point | null, frame: PlateFrame): boolean {
  if (!point) return true;
  const margin = edgeMargin(frame);
  return (
    point.x < -margin ||
    point.y < -margin ||
    point.x > frame.width + margin ||
    point.y > frame.height + margin
  );
}

/**
 * Rf and the rest of marks in pixels, computed on the plate that the four corners carry them to. Lines may be drawn
 * beyond the plate's edge, spots and lanes may not lie there. Lane places in the answer stay in pixels.
 */
export function measureOnPlate(marks: Marks, frame: PlateFrame): Measured {
  const problems: MarkProblem[] = [];
  const flags = new Set<RfFlag>();
  const say = (path: string, message: string) => {
    if (!problems.some((one) => one.path === path && one.message === message))
      problems.push({ path, message });
  };
  const carried = carryMarks(marks, frame);
  for (const key of ['baseline', 'front'] as const) {
    if (carried[key].some((point) => point === null))
      say(
        key,
        `A point of the ${key === 'front' ? 'solvent front' : 'baseline'} lies far off the plate: draw it again.`,
      );
  }
  const lines = {
    baseline: carried.baseline.flatMap((point) => point ?? []),
    front: carried.front.flatMap((point) => point ?? []),
    units: frame.unit === 'mm' ? ('mm' as const) : ('px' as const),
    direction: 'up' as const,
    perspectiveCorrected: true,
  };
  const lanes = marks.lanes.map((lane, l) => {
    const place = carried.lanes[l]!;
    const margin = edgeMargin(frame);
    if (place.x !== null && (place.x < -margin || place.x > frame.width + margin))
      say(`lanes.${l}.x`, 'The lane lies off the plate: mark it again, or set the corners right.');
    const spots = lane.spots.map((spot, s) => {
      const at = place.spots[s] ?? null;
      if (!at || isOff(at, frame)) {
        say(
          `lanes.${l}.spots.${s}`,
          'The spot lies off the plate: mark its centre again, or set the corners right.',
        );
        return null;
      }
      const result = computeRf({ ...lines, spot: at, shape: spot.shape });
      if (!result.ok) {
        say(result.field === 'spot' ? `lanes.${l}.spots.${s}` : result.field, result.problem);
        return null;
      }
      for (const flag of result.flags) if (flagsOfPhoto.includes(flag)) flags.add(flag);
      return { rf: result.rf, rfUncertainty: result.rfUncertainty, flags: result.flags };
    });
    if (spots.length === 0 && place.x !== null) {
      const result = computeRf({ ...lines, spot: { x: place.x, y: middleOf(lines) } });
      if (result.ok) for (const flag of result.flags) if (flagsOfPhoto.includes(flag)) flags.add(flag);
      if (!result.ok && result.field !== 'spot') say(result.field, result.problem);
    }
    const x = lane.x ?? (lane.spots.length > 0 ? meanX(lane.spots) : null);
    return { x, spots };
  });
  return { lanes, flags: [...flags], problems };
}

function meanX(points: readonly Point[]): number {
  return points.reduce((sum, point) => sum + point.x, 0) / points.length;
}

function middleOf({ baseline, front }: { baseline: Point[]; front: Point[] }): number {
  const all = [...baseline, ...front];
  return all.reduce((sum, point) => sum + point.y, 0) / Math.max(1, all.length);
}
