import { Compound } from '@/lib/database/records';
import { associationClassOfSmiles, type AssociationClass } from '@/lib/distillation/boiling-point/associates';
import type {
  AntoineSet,
  VapourPressureData,
  WagnerSet,
} from '@/lib/distillation/boiling-point/vapour-pressure-data';
import { notFound, Problem } from '@/lib/errors';
import type { LiteratureValue } from '@/models';
import { listLiteratureInForce } from './find-literature';
import { structureFeatures } from './structure';

function antoineOf(row: LiteratureValue | undefined): AntoineSet | undefined {
  const { A, B, C } = row?.coefficients ?? {};
  if (!row || A === undefined || B === undefined || C === undefined) return undefined;
  if (row.rangeMinC === null || row.rangeMaxC === null) return undefined;
  return { a: A, b: B, c: C, tMinC: row.rangeMinC, tMaxC: row.rangeMaxC, source: row.source };
}

function wagnerOf(row: LiteratureValue | undefined): WagnerSet | undefined {
  const { criticalTemperatureK, criticalPressureKPa, A, B, C, D } = row?.coefficients ?? {};
  if (!row || criticalTemperatureK === undefined || criticalPressureKPa === undefined) return undefined;
  if (A === undefined || B === undefined || C === undefined || D === undefined) return undefined;
  return {
    tcK: criticalTemperatureK,
    pcKPa: criticalPressureKPa,
    a: A,
    b: B,
    c: C,
    d: D,
    source: row.source,
  };
}

/**
 * Whether the liquid holds together by hydrogen bonds, and its class where the structure tells. A SMILES that the
 * small reader does not know goes to the structure library; no SMILES counts as not associated.
 */
async function associationOf(
  smiles: string | null,
): Promise<{ associated: boolean; associationClass?: AssociationClass }> {
  if (smiles === null) return { associated: false };
  const found = associationClassOfSmiles(smiles);
  if (found === null) return { associated: false };
  if (found !== undefined) return { associated: true, associationClass: found };
  const { alcohol, acid, phenol, water } = await structureFeatures(smiles).catch(() => NO_GROUPS);
  if (acid) return { associated: true, associationClass: 'acid' };
  if (alcohol) return { associated: true, associationClass: 'alcohol' };
  return phenol || water ? { associated: true, associationClass: 'other' } : { associated: false };
}

const NO_GROUPS = { alcohol: false, acid: false, phenol: false, water: false };

/**
 * What is known of a compound's vapour pressure: its preferred normal boiling point and its sets of coefficients in
 * force, for boilingPointAtPressure and separation. Null for an unknown compound or one without a normal boiling point.
 */
export async function findVapourPressureData(compoundId: string): Promise<VapourPressureData | null> {
  const compound = await Compound.findByPk(compoundId);
  if (!compound) return null;
  const rows = await listLiteratureInForce(
    [compoundId],
    ['normal boiling point', 'Antoine coefficients', 'Wagner coefficients'],
  );
  const first = (property: string) => rows.find((row) => row.property === property);
  const boils = rows.find((row) => row.property === 'normal boiling point' && row.preferred);
  if (!boils || boils.value === null) return null;
  const antoine = antoineOf(first('Antoine coefficients'));
  const wagner = wagnerOf(first('Wagner coefficients'));
  return {
    name: compound.name,
    normalBoilingPointC: boils.value,
    normalBoilingPointSource: boils.source,
    ...(wagner && { wagner }),
    ...(antoine && { antoine }),
    ...(await associationOf(compound.smiles)),
  };
}

/** As findVapourPressureData. @throws Problem 404 for an unknown compound, 422 without a normal boiling point. */
export async function requireVapourPressureData(compoundId: string): Promise<VapourPressureData> {
  const data = await findVapourPressureData(compoundId);
  if (data) return data;
  const compound = await Compound.findByPk(compoundId);
  if (!compound) throw notFound('compound');
  throw new Problem(
    'invalid',
    `No normal boiling point is kept for ${compound.name}. Add one with its source to the compound first.`,
  );
}
