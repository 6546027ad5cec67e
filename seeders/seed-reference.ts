import { Op } from 'sequelize';
import { newId } from '@/lib/database/ids';
import { Compound, CompoundSynonym, LiteratureValue } from '@/lib/database/records';
import {
  readReferenceCompounds,
  readReferenceLiteratureValues,
  type ReferenceCompound,
  type ReferenceLiteratureValue,
} from './reference/read-reference';
import { seedOnce } from './seed-step';

const BATCH = 25;

function compoundRow(compound: ReferenceCompound) {
  return {
    id: newId(),
    name: compound.name,
    casNumber: compound.cas,
    formula: compound.formula,
    molarMassGMol: compound.molarMassGMol,
    smiles: compound.smiles,
    inchiKey: compound.inchikey,
    peroxideClass: compound.peroxideClass,
  };
}

function literatureRow(compoundId: string, row: ReferenceLiteratureValue) {
  const { property, value, coefficients, unit, temperatureC, pressureKPa, wavelengthNm } = row;
  const { rangeMinC, rangeMaxC, source, preferred, note } = row;
  return {
    id: newId(),
    compoundId,
    ...{ property, value, coefficients, unit, temperatureC, pressureKPa, wavelengthNm },
    ...{ rangeMinC, rangeMaxC, source, preferred, note },
  };
}

/** As the database compares names: without regard to case and accents. */
function isSameName(one: string, other: string): boolean {
  return one.localeCompare(other, 'en', { sensitivity: 'base' }) === 0;
}

function distinctSynonyms({ name, synonyms }: ReferenceCompound): string[] {
  return synonyms.filter(
    (synonym, at) => ![name, ...synonyms.slice(0, at)].some((earlier) => isSameName(earlier, synonym)),
  );
}

/** Lays down one batch. A compound that people have entered under the same name or number stays as they left it. */
async function seedBatch(
  number: number,
  batch: ReferenceCompound[],
  values: Map<string, ReferenceLiteratureValue[]>,
) {
  return seedOnce(`reference compounds ${number}`, 'reference.laid_down', async ({ transaction }) => {
    const names = batch.map(({ name }) => name);
    const numbers = batch.map(({ cas }) => cas);
    const theirs = await Compound.findAll({
      where: { [Op.or]: [{ name: names }, { casNumber: numbers }] },
      transaction,
    });
    const fresh = batch.filter(
      ({ name, cas }) => !theirs.some((kept) => kept.casNumber === cas || isSameName(kept.name, name)),
    );
    const rows = fresh.map((compound) => ({ compound, row: compoundRow(compound) }));
    const synonyms = rows.flatMap(({ compound, row }) =>
      distinctSynonyms(compound).map((name) => ({ id: newId(), compoundId: row.id, name })),
    );
    const literature = rows.flatMap(({ compound, row }) =>
      (values.get(compound.cas) ?? []).map((value) => literatureRow(row.id, value)),
    );
    await Compound.bulkCreate(
      rows.map(({ row }) => row),
      { transaction },
    );
    await CompoundSynonym.bulkCreate(synonyms, { transaction });
    await LiteratureValue.bulkCreate(literature, { transaction });
    return {
      compounds: fresh.map(({ name, cas }) => `${name} (${cas})`),
      leftAlone: theirs.map(({ name }) => name),
      synonyms: synonyms.length,
      literatureValues: literature.length,
    };
  });
}

/** Seeds the reference table of liquids with their synonyms and literature values, once. @returns batches done now. */
export async function seedReference(): Promise<number> {
  const compounds = await readReferenceCompounds();
  const values = new Map<string, ReferenceLiteratureValue[]>();
  for (const row of await readReferenceLiteratureValues())
    values.set(row.cas, [...(values.get(row.cas) ?? []), row]);
  let done = 0;
  for (let from = 0; from < compounds.length; from += BATCH)
    if (await seedBatch(from / BATCH + 1, compounds.slice(from, from + BATCH), values)) done += 1;
  return done;
}
