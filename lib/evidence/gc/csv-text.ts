/** Encodings that a table of numbers is taken in. */
export type TextEncoding = 'utf-8' | 'utf-8 with BOM' | 'utf-16le' | 'utf-16be';

export interface TableBytes {
  encoding: TextEncoding;
  /** One byte a character; characters beyond Latin-1 in UTF-16 become "?". They occur in headings only. */
  bytes: Uint8Array;
}

function narrow(bytes: Uint8Array, start: number, littleEndian: boolean): Uint8Array {
  const length = (bytes.length - start) >> 1;
  const narrowed = new Uint8Array(length);
  const low = littleEndian ? start : start + 1;
  const high = littleEndian ? start + 1 : start;
  for (let i = 0; i < length; i++) narrowed[i] = bytes[high + 2 * i] === 0 ? bytes[low + 2 * i]! : 0x3f;
  return narrowed;
}

/**
 * Tells the encoding by its byte order mark, or for UTF-16 without one by the zero bytes of its digits, and gives
 * one byte a character so that the number scanner has one form to read.
 */
export function readTableBytes(bytes: Uint8Array): TableBytes {
  const [a, b, c] = [bytes[0], bytes[1], bytes[2]];
  if (a === 0xff && b === 0xfe) return { encoding: 'utf-16le', bytes: narrow(bytes, 2, true) };
  if (a === 0xfe && b === 0xff) return { encoding: 'utf-16be', bytes: narrow(bytes, 2, false) };
  if (a === 0xef && b === 0xbb && c === 0xbf) return { encoding: 'utf-8 with BOM', bytes: bytes.subarray(3) };
  const looked = Math.min(bytes.length & ~1, 200);
  let evenZeros = 0;
  let oddZeros = 0;
  for (let i = 0; i < looked; i += 2) {
    if (bytes[i] === 0) evenZeros++;
    if (bytes[i + 1] === 0) oddZeros++;
  }
  if (looked >= 4 && oddZeros > 0.4 * looked && evenZeros === 0) {
    return { encoding: 'utf-16le', bytes: narrow(bytes, 0, true) };
  }
  if (looked >= 4 && evenZeros > 0.4 * looked && oddZeros === 0) {
    return { encoding: 'utf-16be', bytes: narrow(bytes, 0, false) };
  }
  return { encoding: 'utf-8', bytes };
}
