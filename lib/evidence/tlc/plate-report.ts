import type { Actor } from '@/lib/auth/actor';
import { Compound, EvidenceFile, Run, User } from '@/lib/database/records';
import { notFound } from '@/lib/errors';
import { drawOnPhoto, drawOnPlate, type DrawnMarks } from './drawn-marks';
import { loadPlate } from './load-plate';
import { requirePlate } from './require-plate';
import type { PlatePhotoView, PlateView } from './schema';
import { visualiserName } from './visualiser-name';

export type ReportPhoto = {
  photo: PlatePhotoView;
  visualiser: string;
  /** The rectified picture, or the photo itself where its corners are not marked. */
  pictureHref: string;
  isRectified: boolean;
  marks: DrawnMarks | null;
  fileName: string;
  sha256: string;
  takenAt: string | null;
};

export type PlateReport = {
  plate: PlateView;
  target: string;
  markedBy: string;
  photos: ReportPhoto[];
};

function reportPhoto(plate: PlateView, photo: PlatePhotoView, file: EvidenceFile): ReportPhoto {
  const onPlate = drawOnPlate(photo, plate);
  return {
    photo,
    visualiser: visualiserName(photo.visualiser),
    pictureHref: onPlate
      ? `/api/v1/plates/${plate.id}/rectified?photo=${photo.evidenceId}&width=800`
      : `/api/v1/evidence/${photo.evidenceId}/preview?width=1024`,
    isRectified: onPlate !== null,
    marks: onPlate ?? drawOnPhoto(photo, file.widthPx, file.heightPx),
    fileName: file.fileName,
    sha256: file.sha256,
    takenAt: file.takenAt?.toISOString() ?? null,
  };
}

/** Everything on the printed report of a plate. 404 for a plate that the actor may not see. */
export async function plateReport(actor: Actor, id: string): Promise<PlateReport> {
  const row = await requirePlate(actor, id);
  const plate = await loadPlate(row);
  const [run, person, files] = await Promise.all([
    Run.findByPk(row.runId, { include: [{ model: Compound, as: 'target' }] }),
    User.findByPk(row.markedById, { attributes: ['id', 'name'] }),
    EvidenceFile.findAll({ where: { id: plate.photos.map((photo) => photo.evidenceId) } }),
  ]);
  if (!run) throw notFound('plate with this id');
  return {
    plate,
    target: (run as Run & { target: Compound }).target.name,
    markedBy: person?.name ?? 'not recorded',
    photos: plate.photos.flatMap((photo) => {
      const file = files.find((one) => one.id === photo.evidenceId);
      return file ? [reportPhoto(plate, photo, file)] : [];
    }),
  };
}
