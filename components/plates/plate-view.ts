import { framePlate, type PlateFrame, type PlateSize } from '@/lib/evidence/tlc/plate-frame';
import { alongAt } from '@/lib/evidence/tlc/polyline';
import type { Extent } from './edit-marks';
import { type MarkRef, type Marks, nearestLane, type Point } from './marks';

/** The plate's own plane seen through its corners; null without four corners that outline one. */
export function frameOf({ corners }: Pick<Marks, 'corners'>, size: PlateSize): PlateFrame | null {
  if (corners.length !== 4) return null;
  const result = framePlate(corners, size);
  return result.ok ? result.frame : null;
}

const flat = (points: readonly Point[]) => points.map(({ x, y }) => ({ across: x, along: y }));
const isPoint = (point: Point | null): point is Point => point !== null;

/** The baseline's height at a place across, in the coordinates of its points. */
function heightAt(line: readonly Point[], x: number): number | null {
  return line.length === 0 ? null : alongAt(flat(line), x);
}

/** Where the lane that runs through a place of the photo crosses the baseline, px. */
export function footUnder(marks: Pick<Marks, 'baseline'>, frame: PlateFrame | null, at: Point): number {
  const onPlate = frame?.toPlate(at);
  const line = frame ? marks.baseline.map(frame.toPlate).filter(isPoint) : [];
  const y = onPlate ? heightAt(line, onPlate.x) : null;
  return onPlate && y !== null ? (frame!.toPhoto({ x: onPlate.x, y })?.x ?? at.x) : at.x;
}

/** Where a mark goes that is set down at a place of the photo: a lane is moved at its foot. */
export function placeFor(
  marks: Pick<Marks, 'baseline'>,
  frame: PlateFrame | null,
  ref: MarkRef,
  at: Point,
): Point {
  return ref.kind === 'lane' ? { x: footUnder(marks, frame, at), y: 0 } : at;
}

/** The lane nearest to a place of the photo, or -1. */
export function laneAt(marks: Marks, frame: PlateFrame | null, at: Point): number {
  return nearestLane(marks, footUnder(marks, frame, at));
}

/** A place on a lane, `share` of the way down: of the plate where its corners are known, else of the photo. */
export function placeOnLane(
  marks: Pick<Marks, 'baseline'>,
  frame: PlateFrame | null,
  x: number,
  share: number,
  extent: Extent,
): Point {
  const y = heightAt(marks.baseline, x);
  const onPlate = frame && y !== null ? frame.toPlate({ x, y }) : null;
  const place = onPlate && frame!.toPhoto({ x: onPlate.x, y: share * frame!.height });
  return place ?? { x, y: share * extent.height };
}

/** A line through its points, its end pieces going on to the edges of the plate, or of the photo without corners. */
export function throughEdges(points: readonly Point[], frame: PlateFrame | null, extent: Extent): Point[] {
  const carried = frame ? points.map(frame.toPlate) : [];
  if (frame && carried.length > 0 && carried.every(isPoint)) {
    return extend(carried as Point[], frame.width)
      .map(frame.toPhoto)
      .filter(isPoint);
  }
  return extend(points, extent.width);
}

function extend(points: readonly Point[], width: number): Point[] {
  const sorted = [...points].sort((a, b) => a.x - b.x);
  const ends = [0, width].map((x) => ({ x, y: alongAt(flat(sorted), x) ?? sorted[0]!.y }));
  return [ends[0]!, ...sorted, ends[1]!];
}
