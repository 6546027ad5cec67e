import { parseCasNumber } from './cas-number';
import { normaliseFormula } from './formula';

/** What a search text may stand for, ready for the database. */
export interface CompoundSearch {
  /** Pattern of names that begin with the text. */
  prefix: string;
  /** Pattern of names that hold the text. */
  infix: string;
  /** Pattern of CAS numbers, or null where the text is none and begins none. */
  cas: string | null;
  /** Pattern of InChIKeys, or null. */
  inchiKey: string | null;
  /** Formula in Hill order, or null. */
  formula: string | null;
}

const escapeLike = (text: string) => text.replace(/[\\%_]/g, (sign) => `\\${sign}`);

/** Reads a search text: every reading that makes sense is tried, so nobody has to say what kind of text it is. */
export function parseCompoundSearch(text: string): CompoundSearch {
  const bare = text.trim();
  const written = escapeLike(bare);
  const upper = bare.toUpperCase();
  return {
    prefix: `${written}%`,
    infix: `%${written}%`,
    cas: parseCasNumber(bare) ?? (/^\d{2,7}(?:-\d{0,2}){0,1}$/.test(bare) ? `${bare}%` : null),
    inchiKey: /^[A-Z]{14}(?:-[A-Z]{0,10}(?:-[A-Z]?)?)?$/.test(upper) ? `${upper}%` : null,
    formula: normaliseFormula(bare),
  };
}
