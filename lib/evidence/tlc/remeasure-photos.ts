import type { Transaction } from 'sequelize';
import { type Plate, PlatePhoto, PlateSpot } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';
import { type FollowedMarks, followMarks } from './follow-marks';
import { type Measured, measureMarks } from './measure-marks';
import type { PlateBody, PlatePhotoView, PlateView } from './schema';
import { marksOfPhoto } from './with-change';

type Size = { widthMm: number | null; heightMm: number | null };

function measureAnew(view: PlatePhotoView, followed: FollowedMarks, size: Size): Measured {
  const { widthMm, heightMm } = size;
  const extent =
    view.units === 'mm' && widthMm && heightMm ? { width: widthMm, height: heightMm } : undefined;
  const marks = marksOfPhoto(view);
  const lanes = marks.lanes.map((lane, l) => ({ ...lane, x: followed.laneX[l] ?? lane.x }));
  const { baseline, front } = followed;
  return measureMarks({ ...marks, lanes, baseline, front, widthMm, heightMm, extent });
}

async function writeAnew(
  view: PlatePhotoView,
  followed: FollowedMarks,
  measured: Measured,
  transaction: Transaction,
): Promise<void> {
  const kept = view.flags.filter((flag) => flag === 'visualiser not known');
  const photo = await PlatePhoto.findByPk(view.id, { transaction });
  // Silent: the photo that was marked last stays the one that was marked last.
  await photo?.update({ ...followed, flags: [...measured.flags, ...kept] }, { transaction, silent: true });
  const spots = await PlateSpot.findAll({ where: { photoId: view.id }, transaction });
  for (const [l, lane] of view.lanes.entries()) {
    const ofLane = spots.filter((spot) => spot.laneId === lane.id).sort((a, b) => a.position - b.position);
    for (const [s, spot] of ofLane.entries()) {
      const { rf, rfUncertainty, flags } = measured.lanes[l]!.spots[s]!;
      await spot.update({ rf, rfUncertainty, flags }, { transaction });
    }
  }
}

/**
 * Brings the other photos of a plate along after one was changed: lines and lanes that they took over follow, and with
 * them, or with the plate's size, their Rf. `before` is the plate as it was. 422 when spots that are there do not fit.
 */
export async function remeasurePhotos(
  before: PlateView,
  body: PlateBody,
  { widthMm, heightMm }: Plate,
  transaction: Transaction,
): Promise<void> {
  const size = { widthMm, heightMm };
  const isResized = before.widthMm !== widthMm || before.heightMm !== heightMm;
  const was = before.photos.find((photo) => photo.evidenceId === body.evidenceId);
  for (const view of before.photos.filter((photo) => photo.evidenceId !== body.evidenceId)) {
    const followed = followMarks(view, was ? { marks: was, size: before } : null, { marks: body, size });
    const measured = measureAnew(view, followed, size);
    const [problem] = measured.problems;
    if (problem)
      throw invalidField(
        isResized ? 'widthMm' : 'baseline',
        `The marks of another photo of this plate do not fit this change. ${problem.message}`,
      );
    await writeAnew(view, followed, measured, transaction);
  }
}
