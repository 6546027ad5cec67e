import { ATOMIC_WEIGHTS_G_MOL } from './atomic-weights';

/** Atoms of each element, by symbol. */
export type ElementCounts = Readonly<Record<string, number>>;

/**
 * Two-letter symbols that win over two one-letter symbols where the case was not typed:
 * `c2hcl3` is a chloride, but `c2h6os` holds oxygen and sulphur, not osmium.
 */
const LOOSE_PAIRS = new Set(['cl', 'br', 'si', 'li', 'na', 'mg', 'al', 'zn', 'ti', 'ge', 'se']);
const MAX_ATOMS = 10_000;

function plain(text: string): string {
  return text.replace(/\s+/g, '').replace(/[\u2080-\u2089]/g, (sign) => String(sign.charCodeAt(0) - 0x2080));
}

/** Splits the formula into symbols, numbers and brackets; null where a sign is none of them. */
function tokens(text: string, caseTyped: boolean): string[] | null {
  const found: string[] = [];
  for (let at = 0; at < text.length;) {
    const rest = text.slice(at);
    const mark = /^(?:\d+|[()])/.exec(rest)?.[0];
    const symbol = caseTyped ? /^[A-Z][a-z]?/.exec(rest)?.[0] : looseSymbol(rest);
    const token = mark ?? symbol;
    if (token === undefined) return null;
    if (mark === undefined && !(token in ATOMIC_WEIGHTS_G_MOL)) return null;
    found.push(token);
    at += mark === undefined ? token.length : mark.length;
  }
  return found;
}

function looseSymbol(rest: string): string | undefined {
  const pair = rest.slice(0, 2).toLowerCase();
  if (LOOSE_PAIRS.has(pair)) return `${pair[0]?.toUpperCase()}${pair[1]}`;
  const letter = rest.slice(0, 1).toUpperCase();
  return /^[A-Z]$/.test(letter) ? letter : undefined;
}

function add(into: Map<string, number>, counts: Map<string, number>, times: number): void {
  for (const [symbol, count] of counts) into.set(symbol, (into.get(symbol) ?? 0) + count * times);
}

/** Sums the tokens; null where brackets do not close or a number stands in no place of one. */
function sum(parts: string[]): Map<string, number> | null {
  const open: Map<string, number>[] = [new Map()];
  for (let at = 0; at < parts.length; at += 1) {
    const part = parts[at] ?? '';
    if (/^\d/.test(part)) return null;
    if (part === '(') {
      open.push(new Map());
      continue;
    }
    const group = part === ')' ? open.pop() : new Map([[part, 1]]);
    const target = open.at(-1);
    if (!group || !target || group.size === 0) return null;
    const next = parts[at + 1] ?? '';
    const numbered = /^\d/.test(next);
    const times = numbered ? Number(next) : 1;
    if (times < 1 || times > MAX_ATOMS) return null;
    add(target, group, times);
    if (numbered) at += 1;
  }
  return open.length === 1 ? (open[0] ?? null) : null;
}

/**
 * Reads a typed molecular formula: `C4H8O2`, `c4h8o2`, `(CH3)2CO`, with subscript digits or spaces.
 * A formula typed with the usual capitals is read strictly (`CO` carbon and oxygen); one typed in a single case is
 * read with chlorine, bromine, silicon and a few metals as two letters and every other letter as its own element.
 * @returns the atoms of each element, or null where the text is no formula of known elements.
 */
export function parseFormula(text: string): ElementCounts | null {
  const bare = plain(text);
  if (bare === '' || bare.length > 100) return null;
  const parts = tokens(bare, true) ?? (isOneCase(bare) ? tokens(bare, false) : null);
  const counts = parts === null ? null : sum(parts);
  if (counts === null || counts.size === 0) return null;
  const atoms = [...counts.values()].reduce((total, count) => total + count, 0);
  return atoms > MAX_ATOMS ? null : Object.fromEntries(counts);
}

function isOneCase(text: string): boolean {
  return text === text.toLowerCase() || text === text.toUpperCase();
}

/** The formula in the order of Hill (J. Am. Chem. Soc. 1900, 22, 478): C, H, then the others by letter. */
export function hillFormula(counts: ElementCounts): string {
  const rank = (symbol: string) => (counts.C ? ({ C: 0, H: 1 }[symbol] ?? 2) : 2);
  return Object.keys(counts)
    .sort((a, b) => rank(a) - rank(b) || (a < b ? -1 : 1))
    .map((symbol) => `${symbol}${counts[symbol] === 1 ? '' : counts[symbol]}`)
    .join('');
}

/** A typed formula in Hill order (`c4h8o2` becomes `C4H8O2`), or null where it cannot be read. */
export function normaliseFormula(text: string): string | null {
  const counts = parseFormula(text);
  return counts === null ? null : hillFormula(counts);
}

/** Molar mass in g/mol from the abridged standard atomic weights. */
export function molarMassGMol(counts: ElementCounts): number {
  return Object.entries(counts).reduce(
    (mass, [symbol, count]) => mass + count * (ATOMIC_WEIGHTS_G_MOL[symbol] ?? Number.NaN),
    0,
  );
}
