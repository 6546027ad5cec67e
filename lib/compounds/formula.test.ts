import { describe, expect, it } from 'vitest';
import { hillFormula, molarMassGMol, normaliseFormula, parseFormula } from './formula';

describe('molecular formulas', () => {
  it.each([
    ['c4h8o2', 'C4H8O2'],
    ['C4H8O2', 'C4H8O2'],
    ['O2H8C4', 'C4H8O2'],
    ['C₁₀H₁₈O', 'C10H18O'],
    ['(CH3)2CO', 'C3H6O'],
    ['CH3(CH2)4CH3', 'C6H14'],
    ['CH3COOH', 'C2H4O2'],
    ['chcl3', 'CHCl3'],
    ['CH2CL2', 'CH2Cl2'],
    ['c2h6os', 'C2H6OS'],
    ['c6h5no2', 'C6H5NO2'],
    ['c3h9sicl', 'C3H9ClSi'],
    ['h2o', 'H2O'],
    ['C4 H8 O2', 'C4H8O2'],
    ['CO', 'CO'],
    ['CS2', 'CS2'],
  ])('reads %s as %s', (typed, expected) => {
    expect(normaliseFormula(typed)).toBe(expected);
  });

  it.each(['', '4', 'C4H8O2)', '(CH3', 'C0H4', 'Xx2', 'hello', 'C()2', 'C4H8O2;', '2H2O', 'C99999999'])(
    'refuses %s',
    (typed) => {
      expect(parseFormula(typed)).toBeNull();
    },
  );

  it('orders a formula without carbon by letter, as Hill does', () => {
    expect(hillFormula({ O: 4, S: 1, H: 2 })).toBe('H2O4S');
  });

  it('orders carbon, hydrogen, then the others by letter', () => {
    expect(hillFormula({ O: 1, Cl: 1, H: 7, C: 7, Br: 1 })).toBe('C7H7BrClO');
  });

  it('sums the molar mass from the standard atomic weights', () => {
    // CAS Common Chemistry: ethyl acetate 88.11, water 18.02, chloroform 119.38 g/mol (from memory).
    expect(molarMassGMol({ C: 4, H: 8, O: 2 })).toBeCloseTo(88.106, 2);
    expect(molarMassGMol({ H: 2, O: 1 })).toBeCloseTo(18.015, 2);
    expect(molarMassGMol({ C: 1, H: 1, Cl: 3 })).toBeCloseTo(119.37, 1);
  });
});
