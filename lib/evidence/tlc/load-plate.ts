import type { Transaction } from 'sequelize';
import { Compound, Fraction, Plate, PlateLane, PlatePhoto, PlateSpot, Run } from '@/lib/database/records';
import { loadPlateCompounds } from './load-plate-compounds';
import { presentPlate } from './present';
import type { PlateView } from './schema';

/** Plates with all that lies on them, in the order of the given rows. */
export async function loadPlates(plates: Plate[], transaction?: Transaction): Promise<PlateView[]> {
  if (plates.length === 0) return [];
  const plateId = plates.map((plate) => plate.id);
  const [photos, lanes, runs] = await Promise.all([
    PlatePhoto.findAll({
      where: { plateId },
      order: [
        ['createdAt', 'ASC'],
        ['id', 'ASC'],
      ],
      transaction,
    }),
    PlateLane.findAll({ where: { plateId }, order: [['position', 'ASC']], transaction }),
    Run.findAll({ where: { id: [...new Set(plates.map((plate) => plate.runId))] }, transaction }),
  ]);
  const named = (key: 'fractionId' | 'compoundId') =>
    lanes.map((lane) => lane[key]).filter((id) => id !== null);
  const [spots, fractions, compounds, ofRun] = await Promise.all([
    PlateSpot.findAll({
      where: { laneId: lanes.map((lane) => lane.id) },
      order: [['position', 'ASC']],
      transaction,
    }),
    Fraction.findAll({ where: { id: named('fractionId') }, attributes: ['id', 'code'], transaction }),
    Compound.findAll({ where: { id: named('compoundId') }, attributes: ['id', 'name'], transaction }),
    loadPlateCompounds(runs, transaction),
  ]);
  const codes = new Map([...runs, ...fractions].map((record) => [record.id, record.code]));
  const names = new Map(compounds.map((compound) => [compound.id, compound.name]));
  return plates.map((plate) =>
    presentPlate({
      plate,
      photos: photos.filter((photo) => photo.plateId === plate.id),
      lanes: lanes.filter((lane) => lane.plateId === plate.id),
      spots,
      codes,
      names,
      compounds: ofRun.get(plate.runId) ?? [],
    }),
  );
}

export async function loadPlate(plate: Plate, transaction?: Transaction): Promise<PlateView> {
  return (await loadPlates([plate], transaction))[0]!;
}
