import { Op, type Transaction } from 'sequelize';
import { EvidenceFile, PlateLane, PlatePhoto, Trace } from '@/lib/database/records';

/**
 * The files behind a fraction: those filed under it, the photos of plates with a lane of it, and the files its
 * traces were read from. In the order of their ids, which is the order they came in.
 */
export async function listFractionEvidence(
  fractionId: string,
  transaction?: Transaction,
): Promise<EvidenceFile[]> {
  const lanes = await PlateLane.findAll({ where: { fractionId }, transaction });
  const photos = await PlatePhoto.findAll({
    where: { plateId: lanes.map((lane) => lane.plateId) },
    transaction,
  });
  const traces = await Trace.findAll({ where: { fractionId }, transaction });
  const ids = [...photos, ...traces].map((one) => one.evidenceId);
  return EvidenceFile.findAll({
    where: { [Op.or]: [{ fractionId }, { id: ids }] },
    order: [['id', 'ASC']],
    transaction,
  });
}
