import { describe, expect, it } from 'vitest';
import { casCheckDigit, casNumberProblem, formatCasNumber, isCasNumber, parseCasNumber } from './cas-number';

describe('CAS numbers', () => {
  it('computes the check digit of the worked example of CAS (107-07-3)', () => {
    // CAS, "Check Digit Verification of CAS Registry Numbers": 107-07 gives 3.
    expect(casCheckDigit('10707')).toBe(3);
    expect(casCheckDigit('773218')).toBe(5);
  });

  it.each([
    ['141-78-6', '141-78-6'],
    ['141786', '141-78-6'],
    ['  CAS: 141-78-6 ', '141-78-6'],
    ['CAS No. 64\u201117\u20115', '64-17-5'],
    ['7732 - 18 - 5', '7732-18-5'],
    ['000064-17-5', '64-17-5'],
  ])('reads %s', (typed, expected) => {
    expect(parseCasNumber(typed)).toBe(expected);
  });

  it.each(['', 'ethanol', '141-78-7', '14-178-6', '141-786', '1-78-6', '12345678-18-5', '64-17-5; DROP'])(
    'refuses %s',
    (typed) => {
      expect(parseCasNumber(typed)).toBeNull();
      expect(casNumberProblem(typed)).not.toBeNull();
    },
  );

  it('says which last digit would be right', () => {
    expect(casNumberProblem('141-78-7')).toContain('should be 6');
    expect(casNumberProblem('141-78-6')).toBeNull();
  });

  it('finds every single mistyped digit', () => {
    const digits = '141786';
    for (let place = 0; place < digits.length; place += 1)
      for (let digit = 0; digit <= 9; digit += 1) {
        const typed = digits.slice(0, place) + digit + digits.slice(place + 1);
        // A place weight that shares a factor with ten hides some slips: 2 and 5 are such weights.
        const weight = digits.length - 1 - place;
        const hidden = (weight * (digit - Number(digits[place]))) % 10 === 0;
        if (weight === 0 || typed.startsWith('0')) continue;
        expect(parseCasNumber(typed) !== null).toBe(hidden);
      }
  });

  it('knows the usual form from other ways to write it', () => {
    expect(isCasNumber('64-17-5')).toBe(true);
    expect(isCasNumber('64175')).toBe(false);
    expect(formatCasNumber('64175')).toBe('64-17-5');
  });
});
