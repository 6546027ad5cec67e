/** One heavy atom of a structure: its element, whether written as aromatic, its charge, and its bonds. */
export type GraphAtom = {
  element: string;
  aromatic: boolean;
  charge: number;
  /** Hydrogens written in a bracket atom; null where they are implied by the valence. */
  writtenHydrogens: number | null;
  bonds: { to: number; order: number }[];
};

const TOKEN = /(\[[^\]]+\])|(Cl|Br|[BCNOPSFI]|[bcnops])|(%\d\d|\d)|([-=#:/\\])|(\()|(\))|(\.)/y;
const BRACKET = /^\[\d*([A-Z][a-z]?|[a-z]{1,2}|\*)(@{0,2})(H\d?)?([+-]\d?|\+\++|--+)?(?::\d+)?\]$/;
const ORDER: Readonly<Record<string, number>> = { '-': 1, '=': 2, '#': 3, ':': 1.5, '/': 1, '\\': 1 };

/**
 * Reads a SMILES text (OpenSMILES specification) into atoms and bonds: organic subset, brackets, branches and ring
 * closures. Stereo marks are read over. Null where the text is not understood, so that the caller can say
 * "structure not known" rather than guess.
 */
export function readSmiles(smiles: string): GraphAtom[] | null {
  const atoms: GraphAtom[] = [];
  const branches: number[] = [];
  const rings = new Map<string, { atom: number; order: number | null }>();
  let previous = -1;
  let order: number | null = null;

  const connect = (a: number, b: number, given: number | null): void => {
    const implied = atoms[a]!.aromatic && atoms[b]!.aromatic ? 1.5 : 1;
    atoms[a]!.bonds.push({ to: b, order: given ?? implied });
    atoms[b]!.bonds.push({ to: a, order: given ?? implied });
  };

  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < smiles.length) {
    const token = TOKEN.exec(smiles);
    if (!token) return null;
    const [text, bracket, organic, ring, bond, open, close] = token;
    if (bracket || organic) {
      const atom = bracket ? bracketAtom(bracket) : organicAtom(organic!);
      if (!atom) return null;
      atoms.push(atom);
      if (previous >= 0) connect(previous, atoms.length - 1, order);
      previous = atoms.length - 1;
      order = null;
    } else if (ring) {
      if (previous < 0) return null;
      const begun = rings.get(ring);
      if (begun) {
        connect(begun.atom, previous, order ?? begun.order);
        rings.delete(ring);
      } else rings.set(ring, { atom: previous, order });
      order = null;
    } else if (bond) order = ORDER[text]!;
    else if (open) branches.push(previous);
    else if (close) {
      if (branches.length === 0) return null;
      previous = branches.pop()!;
    } else previous = -1;
  }
  return atoms.length > 0 && branches.length === 0 && rings.size === 0 && order === null ? atoms : null;
}

function organicAtom(text: string): GraphAtom {
  const aromatic = text === text.toLowerCase();
  const element = aromatic ? text.toUpperCase() : text;
  return { element, aromatic, charge: 0, writtenHydrogens: null, bonds: [] };
}

function bracketAtom(text: string): GraphAtom | null {
  const match = BRACKET.exec(text);
  if (!match) return null;
  const symbol = match[1]!;
  const aromatic = symbol === symbol.toLowerCase() && symbol !== '*';
  const chargeText = match[4] ?? '';
  const size = /\d/.test(chargeText) ? Number(chargeText.slice(1)) : chargeText.length;
  return {
    element: symbol[0]!.toUpperCase() + symbol.slice(1),
    aromatic,
    charge: chargeText.startsWith('-') ? -size : size,
    writtenHydrogens: match[3] ? Number(match[3].slice(1) || 1) : 0,
    bonds: [],
  };
}
