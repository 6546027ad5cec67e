import type { Transaction } from 'sequelize';
import { vapourPressureDataOf } from './vapour-pressure-of';
import { structureFeatures } from '@/lib/compounds/structure';
import { Compound, LiteratureValue } from '@/lib/database/records';
import type { CompoundFacts } from './judge-inputs';
import { plateFeaturesOf } from './plate-features';

const WATER_CAS = '7732-18-5';

/** Water where its compound record is missing: named, and with no literature value. */
const unknownWater: CompoundFacts = {
  id: 'water',
  name: 'water',
  casNumber: WATER_CAS,
  isWater: true,
  plateFeatures: null,
  normalBoilingPointC: null,
  refractiveIndex: null,
  vapourPressure: null,
};

/** The preferred value of a property; a value that nobody preferred is not used for judging. */
function preferred(values: LiteratureValue[], property: string): LiteratureValue | undefined {
  return values.find((value) => value.property === property && value.preferred);
}

async function factsOf(compound: Compound, values: LiteratureValue[]): Promise<CompoundFacts> {
  const index = preferred(values, 'refractive index');
  const fall = preferred(values, 'temperature coefficient of refractive index');
  const groups = compound.smiles ? await structureFeatures(compound.smiles).catch(() => null) : null;
  const isWater = compound.casNumber === WATER_CAS || groups?.water === true;
  return {
    id: compound.id,
    name: compound.name,
    casNumber: compound.casNumber,
    isWater,
    plateFeatures: groups ? plateFeaturesOf(groups) : null,
    normalBoilingPointC: preferred(values, 'normal boiling point')?.value ?? null,
    refractiveIndex:
      index && index.value !== null && index.temperatureC !== null
        ? {
            n: index.value,
            temperatureC: index.temperatureC,
            fallPerC: fall?.value ?? null,
            source: index.source,
          }
        : null,
    vapourPressure: vapourPressureDataOf(compound, values, groups),
  };
}

/**
 * What judging needs of some compounds, and of water, by id. Two queries in the caller's transaction, so
 * that a judgement never waits for a second connection while it holds one.
 */
export async function loadCompoundFacts(
  compoundIds: string[],
  transaction?: Transaction,
): Promise<{ byId: Map<string, CompoundFacts>; water: CompoundFacts }> {
  const water = await Compound.findOne({ where: { casNumber: WATER_CAS }, transaction });
  const ids = [...new Set([...compoundIds, ...(water ? [water.id] : [])])];
  const compounds = await Compound.findAll({ where: { id: ids }, transaction });
  const values = await LiteratureValue.findAll({
    where: { compoundId: ids, replacedAt: null },
    order: [
      ['preferred', 'DESC'],
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
  const byId = new Map<string, CompoundFacts>();
  for (const compound of compounds) {
    byId.set(
      compound.id,
      await factsOf(
        compound,
        values.filter((value) => value.compoundId === compound.id),
      ),
    );
  }
  return { byId, water: (water && byId.get(water.id)) ?? unknownWater };
}
