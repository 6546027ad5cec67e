import type { Compound, CompoundSynonym, LiteratureValue } from '@/models';
import { peroxideAdvice } from './hazards';
import type { PlateOutlook } from './plate-outlook';
import { NORMAL_PRESSURE_KPA } from './property-names';
import type { CompoundJson, CompoundRow, LiteratureValueJson } from './schema';

type Sourced = { value: number; source: string };

/** A compound as it stands in a list. `boilingPoint` is its preferred normal boiling point. */
export function presentCompoundRow(
  compound: Compound,
  synonyms: readonly CompoundSynonym[],
  boilingPoint: LiteratureValue | null,
): CompoundRow {
  return {
    id: compound.id,
    version: compound.version,
    name: compound.name,
    synonyms: synonyms.map(({ name }) => name),
    cas: compound.casNumber,
    formula: compound.formula,
    molarMassGMol: compound.molarMassGMol,
    smiles: compound.smiles,
    inchiKey: compound.inchiKey,
    peroxideClass: compound.peroxideClass,
    normalBoilingPointC:
      boilingPoint === null || boilingPoint.value === null
        ? null
        : {
            value: boilingPoint.value,
            pressureKPa: boilingPoint.pressureKPa ?? NORMAL_PRESSURE_KPA,
            source: boilingPoint.source,
          },
  };
}

function sourced(row: LiteratureValue | undefined): Sourced | null {
  return row && row.value !== null ? { value: row.value, source: row.source } : null;
}

/** A compound alone. `preferred` holds its preferred literature values in force. */
export function presentCompound(
  compound: Compound,
  synonyms: readonly CompoundSynonym[],
  preferred: readonly LiteratureValue[],
  plate: PlateOutlook,
): CompoundJson {
  const of = (property: string) => preferred.find((row) => row.property === property);
  return {
    ...presentCompoundRow(compound, synonyms, of('normal boiling point') ?? null),
    structure: compound.smiles === null ? null : `/api/v1/compounds/${compound.id}/structure.svg`,
    hazards: {
      peroxide: compound.peroxideClass === null ? null : peroxideAdvice(compound.peroxideClass),
      flashPointC: sourced(of('flash point')),
      autoignitionTemperatureC: sourced(of('autoignition temperature')),
    },
    plate,
    createdAt: compound.createdAt.toISOString(),
    updatedAt: compound.updatedAt.toISOString(),
  };
}

/** A literature value with its conditions and source. `addedBy` is the person's name, null for the reference table. */
export function presentLiteratureValue(row: LiteratureValue, addedBy: string | null): LiteratureValueJson {
  const { temperatureC, pressureKPa, wavelengthNm, rangeMinC, rangeMaxC } = row;
  return {
    id: row.id,
    version: row.version,
    property: row.property,
    value: row.value,
    coefficients: row.coefficients,
    unit: row.unit,
    conditions: { temperatureC, pressureKPa, wavelengthNm, rangeMinC, rangeMaxC },
    uncertainty: row.uncertainty,
    source: row.source,
    note: row.note,
    preferred: row.preferred,
    corrects: row.replacesId,
    replacedAt: row.replacedAt?.toISOString() ?? null,
    reason: row.reason,
    addedBy,
    createdAt: row.createdAt.toISOString(),
  };
}
