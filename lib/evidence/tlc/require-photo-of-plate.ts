import type { Actor } from '@/lib/auth/actor';
import { EvidenceFile } from '@/lib/database/records';
import { invalidField, notFound } from '@/lib/errors';
import { photoGeometry } from './photo-geometry';
import type { Point } from './polyline';
import { requirePlate } from './require-plate';
import { loadPlate } from './load-plate';
import type { PlatePhotoView, PlateView } from './schema';

export type FramedPhoto = {
  plate: PlateView;
  photo: PlatePhotoView & { corners: Point[] };
  evidence: EvidenceFile;
  /** From the units of the photo's marks to its pixels. */
  toPixels: (mark: Point) => Point | null;
};

/**
 * A photo of a plate with its corners, by its evidence id, or the one that was marked last. 404 for a plate that the
 * actor may not see or a photo that it does not have; 422 for one without corners.
 */
export async function requireFramedPhoto(
  actor: Actor,
  plateId: string,
  evidenceId: string | undefined,
): Promise<FramedPhoto> {
  const plate = await loadPlate(await requirePlate(actor, plateId));
  const wanted = evidenceId ?? plate.evidenceId;
  const photo = plate.photos.find((one) => one.evidenceId === wanted);
  const evidence = photo && (await EvidenceFile.findByPk(photo.evidenceId));
  if (!photo || !evidence) throw notFound('photo of this plate with this id');
  const geometry = photo.corners && photoGeometry(photo, plate);
  const { toPixels } = geometry ?? {};
  if (!photo.corners || !geometry || !toPixels)
    throw invalidField('photo', 'This photo has no plate corners yet. Mark its four corners first.');
  const place = (mark: Point) => {
    if (photo.units === 'px') return mark;
    const on = geometry.toPlate(mark);
    return on && toPixels(on);
  };
  return { plate, photo: { ...photo, corners: photo.corners }, evidence, toPixels: place };
}
