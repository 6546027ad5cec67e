import { plateFeaturesOf } from '@/lib/acceptance/plate-features';
import {
  evaporatesFromPlate,
  type Visibility,
  visibilityOnPlate,
  VISUALISERS,
} from '@/lib/evidence/tlc/visualisers';
import { structureFeatures } from './structure';

export type PlateOutlook = {
  /** Null where no boiling point is known. */
  evaporates: boolean | null;
  visualisers: ({ id: string; name: string } & Visibility)[];
};

/**
 * Which visualisers show a compound on a plate, and whether it is likely gone before anyone looks.
 * @param normalBoilingPointC °C at 101.325 kPa, or null where it is not known.
 */
export async function plateOutlook(
  smiles: string | null,
  normalBoilingPointC: number | null,
): Promise<PlateOutlook> {
  const groups = smiles === null ? null : await structureFeatures(smiles).catch(() => null);
  const features = groups ? plateFeaturesOf(groups) : null;
  return {
    evaporates: normalBoilingPointC === null ? null : evaporatesFromPlate(normalBoilingPointC),
    visualisers: VISUALISERS.map((visualiser) => ({
      id: visualiser.id,
      name: visualiser.name,
      ...visibilityOnPlate({ visualiser, features, normalBoilingPointC }),
    })),
  };
}
