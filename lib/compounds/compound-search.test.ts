import { describe, expect, it } from 'vitest';
import { parseCompoundSearch } from './compound-search';

describe('search texts', () => {
  it('reads a CAS number with or without hyphens, and the beginning of one', () => {
    expect(parseCompoundSearch('141-78-6').cas).toBe('141-78-6');
    expect(parseCompoundSearch('141786').cas).toBe('141-78-6');
    expect(parseCompoundSearch('141-7').cas).toBe('141-7%');
    expect(parseCompoundSearch('ethanol').cas).toBeNull();
  });

  it('reads a formula in any order and case', () => {
    expect(parseCompoundSearch('o2h8c4').formula).toBe('C4H8O2');
    expect(parseCompoundSearch('limonene').formula).toBeNull();
  });

  it('reads an InChIKey or its first block', () => {
    expect(parseCompoundSearch('xekowrvhyacxoj-uhfffaoysa-n').inchiKey).toBe('XEKOWRVHYACXOJ-UHFFFAOYSA-N%');
    expect(parseCompoundSearch('XEKOWRVHYACXOJ').inchiKey).toBe('XEKOWRVHYACXOJ%');
    expect(parseCompoundSearch('XEKOW').inchiKey).toBeNull();
  });

  it('takes the wildcards of the database as plain signs', () => {
    expect(parseCompoundSearch('100%_a\\').infix).toBe('%100\\%\\_a\\\\%');
  });
});
