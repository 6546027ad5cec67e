import {
  evaporatesFromPlate,
  type StructureFeatures as PlateFeatures,
  type Visibility,
  visibilityOnPlate,
  VISUALISERS,
} from '@/lib/evidence/tlc/visualisers';
import { structureFeatures } from './structure';

/**
 * The groups of a structure that visualisers answer to, or null where there is no structure to be read.
 * A secondary amine is told from a tertiary one by its N-H ("associates"), which also counts O-H: without either
 * an amine that is not primary is tertiary. Sulfides are not looked for, so they never count as shown.
 */
export async function plateFeatures(smiles: string | null): Promise<PlateFeatures | null> {
  if (smiles === null) return null;
  const found = await structureFeatures(smiles).catch(() => null);
  if (!found) return null;
  const hydroxyl = found.alcohol || found.phenol || found.acid || found.water;
  return {
    chromophore254: found.aromatic || found.conjugated,
    alkene: found.alkene,
    alkyne: found.alkyne,
    alcohol: found.alcohol,
    aldehyde: found.aldehyde,
    ketone: found.ketone,
    phenol: found.phenol,
    thiol: found.thiol,
    sulfide: false,
    primaryAmine: found.primaryAmine,
    secondaryAmine: found.amine && !found.primaryAmine && found.associates && !hydroxyl,
    carboxylicAcid: found.acid,
  };
}

export type PlateOutlook = {
  /** Null where no boiling point is known. */
  evaporates: boolean | null;
  visualisers: ({ id: string; name: string } & Visibility)[];
};

/** Which visualisers show a compound on a plate, and whether it is likely gone before anyone looks. */
export async function plateOutlook(
  smiles: string | null,
  normalBoilingPointC: number | null,
): Promise<PlateOutlook> {
  const features = await plateFeatures(smiles);
  return {
    evaporates: normalBoilingPointC === null ? null : evaporatesFromPlate(normalBoilingPointC),
    visualisers: VISUALISERS.map((visualiser) => ({
      id: visualiser.id,
      name: visualiser.name,
      ...visibilityOnPlate({ visualiser, features, normalBoilingPointC }),
    })),
  };
}
