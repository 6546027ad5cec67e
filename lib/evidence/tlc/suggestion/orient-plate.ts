import type { Point } from '../polyline';
import { findOriginMarks } from './origin-marks';
import { findPencilLines, type PencilLines } from './pencil-lines';
import type { RawPhoto } from './raster';
import { rectify, type FlatPlate } from './rectify';

export type OrientedPlate = {
  flat: FlatPlate;
  /** Top left, top right, bottom right, bottom left of the plate as it was developed. */
  corners: Point[];
  lines: PencilLines;
  /** Origin ticks on the baseline: x of each, in pixels of the flat plate. */
  marks: number[];
  /** The plate lies on its side in the photo. */
  onItsSide: boolean;
};

/**
 * The plate freed of perspective with the solvent running up, and its pencil lines. A plate whose lines run down
 * the photo is turned; which of them is the baseline is told by the origin ticks, or else by the wider margin.
 * Null where the corners outline no plate. A plate on its head looks like an upright one and stays as it is.
 */
export function orientPlate(photo: RawPhoto, corners: readonly Point[]): OrientedPlate | null {
  const upright = look(photo, corners, 0);
  if (!upright || (upright.lines.baseline && upright.lines.front)) return upright;
  const turned = [1, 3]
    .map((turns) => look(photo, corners, turns))
    .filter(
      (one) => one !== null && one.lines.baseline !== null && one.lines.front !== null,
    ) as OrientedPlate[];
  if (turned.length === 0) return upright;
  return turned.reduce((best, one) => (rank(one) > rank(best) ? one : best));
}

function look(photo: RawPhoto, corners: readonly Point[], turns: number): OrientedPlate | null {
  const inOrder = [...corners.slice(turns), ...corners.slice(0, turns)];
  const flat = rectify(photo, inOrder);
  if (!flat) return null;
  const lines = findPencilLines(flat);
  const marks = lines.baseline ? findOriginMarks(flat, lines.baseline.points) : [];
  return { flat, corners: inOrder, lines, marks, onItsSide: turns % 2 === 1 };
}

function rank({ flat, lines, marks }: OrientedPlate): number {
  const points = lines.baseline!.points;
  const margin = 1 - points.reduce((sum, p) => sum + p.y, 0) / points.length / flat.height;
  return marks.length + margin;
}
