/**
 * Groups that are looked for in a structure, each with the patterns (SMARTS) of which one must match.
 * The structure library takes no lists of unlike atoms, so alternatives are written out one by one.
 */
export const FEATURE_PATTERNS = {
  /** Any aromatic ring, furan, pyrrole and thiophene included. */
  aromatic: ['a'],
  /** Two multiple bonds, or a ring and a multiple bond, one single bond apart. Acrylates count: they absorb far below 254 nm. */
  conjugated: [
    '[C;!a]=[C;!a]-[C;!a]=[C,O,N]',
    '[C;!a]=[C;!a]-C#[C,N]',
    'C#C-C#C',
    'c-[C;!a]=[C,O,N]',
    'c-C#[C,N]',
    'c-[N+](=O)[O-]',
  ],
  /** An aldehyde or ketone in conjugation with a double bond or an aromatic ring. */
  conjugatedCarbonyl: [
    '[C;!a]=[C;!a]-[CX3H1]=O',
    '[C;!a]=[C;!a]-[CX3](=O)[#6]',
    'c-[CX3H1]=O',
    'c-[CX3](=O)[#6]',
  ],
  alkene: ['[C;!a]=[C;!a]'],
  alkyne: ['C#C'],
  alcohol: ['[OX2H][CX4]'],
  phenol: ['[OX2H]c'],
  aldehyde: ['[#6][CX3H1]=O', '[CX3H2]=O'],
  ketone: ['[#6][CX3](=O)[#6]'],
  acid: ['[CX3](=O)[OX2H1]'],
  /** Esters, lactones and carbonates; not anhydrides. */
  ester: ['[CX3](=O)[OX2H0][#6;!$(C=O)]'],
  anhydride: ['C(=O)OC=O'],
  amide: ['[NX3][CX3]=O'],
  ether: ['[CX4][OX2][CX4]', '[CX4][OX2;!a]c', 'c[OX2;!a]c', '[CX4][OX2][C;!a]=[C;!a]'],
  thiol: ['[SX2H]'],
  nitrile: ['C#N'],
  nitro: ['[N+](=O)[O-]'],
  halide: ['[F,Cl,Br,I]'],
  primaryAmine: ['[NX3;H2;!$(NC=O)]'],
  /** Amines of every degree, anilines included; neither amides nor ring nitrogen of an aromatic ring. */
  amine: ['[NX3;!a;!$(NC=O);!$(N=O)]'],
  /** Holds O-H or N-H, so the molecules of the liquid hold on to one another. Water is added by its formula. */
  associates: ['[OX2H]', '[N;H1]', '[N;H2]', '[n;H1]'],
} as const satisfies Record<string, readonly string[]>;

export type PatternFeature = keyof typeof FEATURE_PATTERNS;

/** Which groups a structure holds. All false: nothing but saturated carbon and hydrogen, or groups not looked for. */
export type StructureFeatures = Readonly<Record<PatternFeature | 'water', boolean>>;
