import { readSmiles, type GraphAtom } from './smiles-graph';

/**
 * Classes of liquids whose molecules hold together by hydrogen bonds, by how far Maxwell-Bonnell misses them:
 * alcohols and glycols; carboxylic acids (dimers); and other: water, phenols with a free hydroxyl, amides with
 * an N-H. Amines count as not associated: measured against their Wagner sets they lie within the error of the
 * liquids that do not associate.
 */
export type AssociationClass = 'alcohol' | 'acid' | 'other';

/** What a structure holds, found by associationFeaturesOf or by any structure library. */
export type AssociationFeatures = {
  isWater: boolean;
  alcohol: boolean;
  carboxylicAcid: boolean;
  /** A hydroxyl on an aromatic or olefinic carbon, not tied up by a carbonyl group beside it. */
  phenol: boolean;
  /** An amide with at least one N-H. */
  amideWithNH: boolean;
};

/** The class of an associated liquid, or null. An acid counts before an alcohol, an alcohol before the rest. */
export function associationClassOf(features: AssociationFeatures): AssociationClass | null {
  if (features.carboxylicAcid) return 'acid';
  if (features.alcohol) return 'alcohol';
  return features.isWater || features.phenol || features.amideWithNH ? 'other' : null;
}

/**
 * Features from a SMILES text, or null where it cannot be read. The rule is common practice: a hydroxyl whose
 * carbon bears =O is an acid's, one on an sp2 carbon a phenol's, any other an alcohol's. A phenol with a carbonyl
 * group in ortho (salicylaldehyde, methyl salicylate) bonds within itself and does not count: measured against
 * their Wagner sets these two behave like liquids that do not associate.
 */
export function associationFeaturesOf(smiles: string): AssociationFeatures | null {
  const atoms = readSmiles(smiles.trim());
  if (!atoms) return null;
  const features: AssociationFeatures = {
    isWater: atoms.length === 1 && atoms[0]!.element === 'O' && atoms[0]!.charge === 0,
    alcohol: false,
    carboxylicAcid: false,
    phenol: false,
    amideWithNH: false,
  };
  for (const atom of atoms) {
    if (isHydroxyl(atom)) {
      const carbon = atoms[atom.bonds[0]!.to]!;
      if (carbon.element !== 'C') continue;
      if (hasCarbonyl(atoms, carbon)) features.carboxylicAcid = true;
      else if (!isSp2(atoms, carbon)) features.alcohol = true;
      else if (!hasOrthoCarbonyl(atoms, carbon)) features.phenol = true;
    } else if (isNitrogenWithHydrogen(atom)) {
      if (neighbours(atoms, atom).some((n) => n.element === 'C' && hasCarbonyl(atoms, n))) {
        features.amideWithNH = true;
      }
    }
  }
  return features;
}

/** The association class of a structure: null if it does not associate, undefined if the SMILES is not understood. */
export function associationClassOfSmiles(smiles: string): AssociationClass | null | undefined {
  const features = associationFeaturesOf(smiles);
  return features ? associationClassOf(features) : undefined;
}

function neighbours(atoms: GraphAtom[], atom: GraphAtom): GraphAtom[] {
  return atom.bonds.map((bond) => atoms[bond.to]!);
}

function isHydroxyl(atom: GraphAtom): boolean {
  return atom.element === 'O' && atom.charge === 0 && atom.bonds.length === 1 && atom.bonds[0]!.order === 1;
}

function isNitrogenWithHydrogen(atom: GraphAtom): boolean {
  if (atom.element !== 'N' || atom.aromatic || atom.charge !== 0) return false;
  if (atom.writtenHydrogens !== null) return atom.writtenHydrogens > 0;
  return atom.bonds.reduce((sum, bond) => sum + bond.order, 0) < 3;
}

function hasCarbonyl(atoms: GraphAtom[], carbon: GraphAtom): boolean {
  return carbon.bonds.some((bond) => bond.order === 2 && atoms[bond.to]!.element === 'O');
}

function isSp2(atoms: GraphAtom[], carbon: GraphAtom): boolean {
  return carbon.aromatic || carbon.bonds.some((b) => b.order === 2 && atoms[b.to]!.element === 'C');
}

function hasOrthoCarbonyl(atoms: GraphAtom[], phenolCarbon: GraphAtom): boolean {
  return neighbours(atoms, phenolCarbon).some(
    (ortho) =>
      ortho.element === 'C' &&
      isSp2(atoms, ortho) &&
      neighbours(atoms, ortho).some((n) => n.element === 'C' && n !== phenolCarbon && hasCarbonyl(atoms, n)),
  );
}
