import type { Transaction } from 'sequelize';
import { PlatePhoto, PlateSpot } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';
import { measureMarks } from './measure-marks';
import type { PlateView } from './schema';
import { marksOfPhoto } from './with-change';

type Size = { widthMm: number | null; heightMm: number | null };

/**
 * Measures the marks of the other photos of a plate anew after its size was changed, since uncertainties and flags
 * depend on it. `before` is the plate as it was. 422 when marks that are there do not lie on a plate of this size.
 */
export async function remeasurePhotos(
  before: PlateView,
  exceptEvidenceId: string,
  size: Size,
  transaction: Transaction,
): Promise<void> {
  if (before.widthMm === size.widthMm && before.heightMm === size.heightMm) return;
  const { widthMm, heightMm } = size;
  for (const view of before.photos.filter((photo) => photo.evidenceId !== exceptEvidenceId)) {
    const extent =
      view.units === 'mm' && widthMm && heightMm ? { width: widthMm, height: heightMm } : undefined;
    const measured = measureMarks({ ...marksOfPhoto(view), widthMm, heightMm, extent });
    if (measured.problems[0])
      throw invalidField(
        'widthMm',
        `The marks of another photo of this plate do not fit this size. ${measured.problems[0].message}`,
      );
    const kept = view.flags.filter((flag) => flag === 'visualiser not known');
    const photo = await PlatePhoto.findByPk(view.id, { transaction });
    // Silent: the photo that was marked last stays the one that was marked last.
    await photo?.update({ flags: [...measured.flags, ...kept] }, { transaction, silent: true });
    const spots = await PlateSpot.findAll({ where: { photoId: view.id }, transaction });
    for (const [l, lane] of view.lanes.entries()) {
      const ofLane = spots.filter((spot) => spot.laneId === lane.id).sort((a, b) => a.position - b.position);
      for (const [s, spot] of ofLane.entries()) {
        const { rf, rfUncertainty, flags } = measured.lanes[l]!.spots[s]!;
        await spot.update({ rf, rfUncertainty, flags }, { transaction });
      }
    }
  }
}
