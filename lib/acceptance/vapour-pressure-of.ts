import type { StructureFeatures } from '@/lib/compounds/structure-features';
import { associationClassOfSmiles } from '@/lib/distillation/boiling-point/associates';
import type {
  AntoineSet,
  VapourPressureData,
  WagnerSet,
} from '@/lib/distillation/boiling-point/vapour-pressure-data';
import type { Compound, LiteratureValue } from '@/models';

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

function associationOf(smiles: string | null, groups: StructureFeatures | null) {
  const found = smiles ? associationClassOfSmiles(smiles) : null;
  if (found) return { associated: true, associationClass: found };
  if (found === null || !groups) return { associated: false };
  if (groups.acid) return { associated: true, associationClass: 'acid' as const };
  if (groups.alcohol) return { associated: true, associationClass: 'alcohol' as const };
  return groups.phenol || groups.water
    ? { associated: true, associationClass: 'other' as const }
    : { associated: false };
}

/**
 * Vapour-pressure data from literature values in force, preferred first: the preferred normal boiling point
 * (°C at 101.325 kPa) and the coefficient sets. Null without a boiling point.
 */
export function vapourPressureDataOf(
  compound: Compound,
  values: LiteratureValue[],
  groups: StructureFeatures | null,
): VapourPressureData | null {
  const boils = values.find((value) => value.property === 'normal boiling point' && value.preferred);
  if (!boils || boils.value === null) return null;
  const antoine = antoineOf(values.find((value) => value.property === 'Antoine coefficients'));
  const wagner = wagnerOf(values.find((value) => value.property === 'Wagner coefficients'));
  return {
    name: compound.name,
    normalBoilingPointC: boils.value,
    normalBoilingPointSource: boils.source,
    ...(wagner && { wagner }),
    ...(antoine && { antoine }),
    ...associationOf(compound.smiles, groups),
  };
}
