/** Any dash a person may paste: hyphen, non-breaking hyphen, figure, en and em dash, minus sign. */
const DASHES = /[\u2010-\u2015\u2212]/g;

/**
 * The check digit of a CAS registry number.
 * @param body all digits before the check digit, without hyphens.
 * @returns the sum of each digit times its place counted from the right, modulo 10.
 * Source: CAS, "Check Digit Verification of CAS Registry Numbers".
 */
export function casCheckDigit(body: string): number {
  let sum = 0;
  for (let place = 1; place <= body.length; place += 1) sum += place * Number(body[body.length - place]);
  return sum % 10;
}

/** Puts the hyphens into 5 to 10 bare digits: `141786` becomes `141-78-6`. The check digit is not looked at. */
export function formatCasNumber(digits: string): string {
  return `${digits.slice(0, -3)}-${digits.slice(-3, -1)}-${digits.slice(-1)}`;
}

/** The digits of a typed CAS number, or null where it has not the form of one (2 to 7, 2 and 1 digits). */
function digitsOf(text: string): string | null {
  const bare = text
    .trim()
    .replace(/^cas(?:\s*(?:rn|no\.?|number))?\s*:?\s*/i, '')
    .replace(DASHES, '-')
    .replace(/\s*-\s*/g, '-');
  const hyphenated = /^0*([1-9]\d{1,6})-(\d{2})-(\d)$/.exec(bare);
  if (hyphenated) return `${hyphenated[1]}${hyphenated[2]}${hyphenated[3]}`;
  return /^[1-9]\d{4,9}$/.test(bare) ? bare : null;
}

/**
 * Reads a typed CAS number: with or without hyphens, with any kind of dash, with `CAS` before it.
 * @returns the number in its usual form (`141-78-6`), or null where the form or the check digit is wrong.
 */
export function parseCasNumber(text: string): string | null {
  const digits = digitsOf(text);
  if (digits === null) return null;
  return casCheckDigit(digits.slice(0, -1)) === Number(digits.at(-1)) ? formatCasNumber(digits) : null;
}

/** True for a CAS number already in its usual form, with a right check digit. */
export function isCasNumber(text: string): boolean {
  return parseCasNumber(text) === text;
}

/** What is wrong with a typed CAS number and what to do about it, or null where it is right. */
export function casNumberProblem(text: string): string | null {
  const digits = digitsOf(text);
  if (digits === null)
    return 'A CAS number has the form 141-78-6: two to seven digits, two digits, one digit.';
  const expected = casCheckDigit(digits.slice(0, -1));
  if (expected === Number(digits.at(-1))) return null;
  return (
    `The last digit of ${formatCasNumber(digits)} should be ${expected}: ` +
    'at least one digit is mistyped. Compare it with the label.'
  );
}
