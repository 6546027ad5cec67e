import type { StructureFeatures as Groups } from '@/lib/compounds/structure-features';
import type { StructureFeatures as PlateFeatures } from '@/lib/evidence/tlc/visualisers';

/**
 * The groups that visualisers answer to, from the groups found in a structure. Careful on purpose: a
 * conjugated ester (an acrylate) absorbs far below 254 nm and does not count, an amine of unknown degree
 * is not called secondary, and sulfides are not looked for. What is not sure is left out.
 */
export function plateFeaturesOf(groups: Groups): PlateFeatures {
  return {
    chromophore254:
      groups.aromatic || groups.conjugatedCarbonyl || (groups.conjugated && !groups.ester && !groups.acid),
    alkene: groups.alkene,
    alkyne: groups.alkyne,
    alcohol: groups.alcohol,
    aldehyde: groups.aldehyde,
    ketone: groups.ketone,
    phenol: groups.phenol,
    thiol: groups.thiol,
    sulfide: false,
    primaryAmine: groups.primaryAmine,
    secondaryAmine: false,
    carboxylicAcid: groups.acid,
  };
}
