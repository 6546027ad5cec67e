import { turnMillimetres } from './carry-marks';
import { framePlate, type PlateSize } from './plate-frame';
import type { Point } from './polyline';

/** How the marks of one photo, and the photo itself, relate to the plate. */
export type PhotoGeometry = {
  unit: 'mm' | 'relative';
  /** From the units of the photo's marks to the plate. */
  toPlate: (mark: Point) => Point | null;
  /** From the plate to pixels of the photo; null for a photo without corners. */
  toPixels: ((platePoint: Point) => Point | null) | null;
};

export type MarkedPhoto = {
  units: 'px' | 'mm';
  corners?: readonly Point[] | null;
  baseline: readonly Point[];
  front: readonly Point[];
};

/**
 * The geometry of a marked photo; null where its marks have no place on the plate: in pixels without corners, or in
 * millimetres from an unknown edge. Marks in mm meet photos with corners only where the plate's size is known.
 */
export function photoGeometry(photo: MarkedPhoto, size: PlateSize): PhotoGeometry | null {
  const framed = photo.corners ? framePlate(photo.corners, size) : null;
  const frame = framed?.ok ? framed.frame : null;
  if (photo.units === 'px')
    return frame && { unit: frame.unit, toPlate: frame.toPlate, toPixels: frame.toPhoto };
  const turn = turnMillimetres(photo, size.heightMm);
  return turn && { unit: 'mm', toPlate: turn, toPixels: frame?.unit === 'mm' ? frame.toPhoto : null };
}
