const powersOfTen = Array.from({ length: 23 }, (_, k) => 10 ** k);

/** A number and the byte after it; `end` equals the start when there is no number. */
export interface ScannedNumber {
  value: number;
  end: number;
}

function asText(bytes: Uint8Array, from: number, to: number): string {
  let text = '';
  for (let i = from; i < to; i++) text += bytes[i] === 0x2c ? '.' : String.fromCharCode(bytes[i]!);
  return text;
}

/**
 * Reads the number that begins at a byte into `result` (one object for all calls: a million small ones would cost more
 * than the reading). Up to 15 digits are gathered as a whole number and divided by an exact power of ten, which is
 * correctly rounded; anything longer goes through the language's own conversion, so the result is the same bit for bit.
 */
export function scanNumber(
  bytes: Uint8Array,
  start: number,
  limit: number,
  decimal: number,
  result: ScannedNumber,
): void {
  let i = start;
  let negative = false;
  const sign = bytes[i];
  if (sign === 0x2d || sign === 0x2b) {
    negative = sign === 0x2d;
    i++;
  }
  const digitsFrom = i;
  let mantissa = 0;
  let digits = 0;
  let places = 0;
  let byte = i < limit ? bytes[i]! : 0;
  while (byte >= 0x30 && byte <= 0x39) {
    mantissa = mantissa * 10 + (byte - 0x30);
    digits++;
    byte = ++i < limit ? bytes[i]! : 0;
  }
  if (byte === decimal && i < limit) {
    byte = ++i < limit ? bytes[i]! : 0;
    while (byte >= 0x30 && byte <= 0x39) {
      mantissa = mantissa * 10 + (byte - 0x30);
      digits++;
      places++;
      byte = ++i < limit ? bytes[i]! : 0;
    }
  }
  if (digits === 0) {
    result.end = start;
    result.value = Number.NaN;
    return;
  }
  let hasExponent = false;
  if (byte === 0x65 || byte === 0x45) {
    let j = i + 1;
    if (bytes[j] === 0x2d || bytes[j] === 0x2b) j++;
    const exponentFrom = j;
    while (j < limit && bytes[j]! >= 0x30 && bytes[j]! <= 0x39) j++;
    if (j > exponentFrom) {
      hasExponent = true;
      i = j;
    }
  }
  let value: number;
  if (!hasExponent && digits <= 15 && places <= 22)
    value = places === 0 ? mantissa : mantissa / powersOfTen[places]!;
  else value = Number(asText(bytes, digitsFrom, i));
  result.value = negative ? -value : value;
  result.end = i;
}
