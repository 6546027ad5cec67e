import { BoundedMap } from './bounded-map';
import { hillFormula, parseFormula } from './formula';
import { FEATURE_PATTERNS, type PatternFeature, type StructureFeatures } from './structure-features';
import { MAX_DRAWING_SIDE_PX, rewriteDrawing } from './structure-svg';

type StructureLibrary = typeof import('openchemlib');
type Molecule = InstanceType<StructureLibrary['Molecule']>;
type Searcher = InstanceType<StructureLibrary['SSSearcher']>;

const MAX_SMILES_LENGTH = 500;
const MAX_ATOMS = 200;
const CACHE_SIZE = 500;
const drawings = new BoundedMap<string, string>(CACHE_SIZE);
const features = new BoundedMap<string, StructureFeatures>(CACHE_SIZE);
const formulas = new BoundedMap<string, FormulaAndMass>(CACHE_SIZE);

export interface FormulaAndMass {
  /** In Hill order. */
  formula: string;
  /** With natural abundance, rounded to 0.001 g/mol. */
  molarMassGMol: number;
}

export interface DrawingSize {
  width: number;
  height: number;
  /** What a screen reader says; the formula where none is given. */
  title?: string;
}

/** A SMILES that is no structure. The message tells the user what to correct. */
export class StructureError extends Error {
  override readonly name = 'StructureError';
}

let library: Promise<StructureLibrary> | undefined;

/** The library is 1.1 MB, so it is read when the first structure is asked for and not before. */
function loadLibrary(): Promise<StructureLibrary> {
  library ??= import('openchemlib');
  return library;
}

async function readMolecule(smiles: string): Promise<Molecule> {
  const text = smiles.trim();
  if (text === '') throw new StructureError('Enter a SMILES, such as CCOC(C)=O for ethyl acetate.');
  if (text.length > MAX_SMILES_LENGTH)
    throw new StructureError(
      `A SMILES may have up to ${MAX_SMILES_LENGTH} signs; this one has ${text.length}.`,
    );
  if (!/^[A-Za-z0-9@+\-[\]()=#$:/\\.%*]+$/.test(text))
    throw new StructureError(
      'A SMILES holds letters, digits and bond signs only: remove spaces and other signs.',
    );
  // The library forgives a branch left open, and what was cut off would then be missing without a word.
  if (text.split('(').length !== text.split(')').length)
    throw new StructureError('Close every bracket of this SMILES: the numbers of ( and ) differ.');
  const { Molecule: Structure } = await loadLibrary();
  let molecule: Molecule;
  try {
    molecule = Structure.fromSmiles(text);
  } catch {
    throw new StructureError(
      'This SMILES cannot be read: check that every bracket and every ring number is closed.',
    );
  }
  if (molecule.getAllAtoms() === 0 || molecule.getAllAtoms() > MAX_ATOMS)
    throw new StructureError(`A structure holds 1 to ${MAX_ATOMS} atoms.`);
  return molecule;
}

function formulaOf(molecule: Molecule): FormulaAndMass {
  const { formula, relativeWeight } = molecule.getMolecularFormula();
  const counts = parseFormula(formula);
  return {
    formula: counts === null ? formula : hillFormula(counts),
    molarMassGMol: Math.round(relativeWeight * 1000) / 1000,
  };
}

/**
 * Formula (Hill order) and molar mass in g/mol of a SMILES.
 * @throws StructureError where the SMILES cannot be read.
 */
export async function formulaAndMass(smiles: string): Promise<FormulaAndMass> {
  const known = formulas.get(smiles);
  if (known) return known;
  const found = formulaOf(await readMolecule(smiles));
  formulas.set(smiles, found);
  return found;
}

/**
 * A structure drawn as SVG text that may stand in a page: plain shapes in `currentColor`, with a title.
 * @param size width and height in px, 40 to 2000.
 * @throws StructureError where the SMILES cannot be read or the size is out of bounds.
 */
export async function drawStructureSvg(smiles: string, size: DrawingSize): Promise<string> {
  const { width, height } = size;
  for (const side of [width, height])
    if (!(side >= 40 && side <= MAX_DRAWING_SIDE_PX))
      throw new StructureError(`A drawing is 40 to ${MAX_DRAWING_SIDE_PX} px wide and high.`);
  const key = JSON.stringify([smiles, width, height, size.title]);
  const known = drawings.get(key);
  if (known) return known;
  const molecule = await readMolecule(smiles);
  const drawn = molecule.toSVG(width, height, 'structure', {
    suppressChiralText: true,
    suppressCIPParity: true,
    suppressESR: true,
  });
  const svg = rewriteDrawing(
    drawn,
    width,
    height,
    size.title ?? `Structure of ${formulaOf(molecule).formula}`,
  );
  drawings.set(key, svg);
  return svg;
}

function compilePatterns({ SmilesParser }: StructureLibrary): Map<PatternFeature, Molecule[]> {
  const parser = new SmilesParser({ smartsMode: 'smarts' });
  const compile = (pattern: string) => {
    const fragment = parser.parseMolecule(pattern);
    fragment.setFragment(true);
    return fragment;
  };
  const named = Object.entries(FEATURE_PATTERNS) as [PatternFeature, readonly string[]][];
  return new Map(named.map(([feature, patterns]) => [feature, patterns.map(compile)]));
}

let compiled: Map<PatternFeature, Molecule[]> | undefined;

function matches(searcher: Searcher, fragment: Molecule): boolean {
  searcher.setFragment(fragment);
  return searcher.isFragmentInMolecule();
}

/**
 * Which groups a structure holds, by substructure search.
 * @throws StructureError where the SMILES cannot be read.
 */
export async function structureFeatures(smiles: string): Promise<StructureFeatures> {
  const known = features.get(smiles);
  if (known) return known;
  const molecule = await readMolecule(smiles);
  const loaded = await loadLibrary();
  compiled ??= compilePatterns(loaded);
  const searcher = new loaded.SSSearcher();
  searcher.setMolecule(molecule);
  const water = formulaOf(molecule).formula === 'H2O';
  const found = { water } as Record<PatternFeature | 'water', boolean>;
  for (const [feature, fragments] of compiled)
    found[feature] = fragments.some((fragment) => matches(searcher, fragment));
  found.associates ||= water;
  features.set(smiles, found);
  return found;
}
