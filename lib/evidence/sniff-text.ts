/** What a file is, seen from its first bytes, when it has no signature of a binary format. Pure. */
export type TextType = 'chemical/x-jcamp-dx' | 'text/csv' | 'text/tab-separated-values' | 'text/plain';

/** So many lines of numbers in a row make a table, wherever it begins: instruments write long headers. */
const tableLines = 8;
const number = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d+)?$/;

/** Text of the first bytes, by byte-order mark, else UTF-8, else Latin-1; null when they are no text. */
export function decodeText(bytes: Uint8Array): string | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes);
  // Tab, line ends, form feed and the old end-of-file mark are the only control characters that text has.
  if (bytes.some((byte) => byte < 0x20 && ![0x09, 0x0a, 0x0c, 0x0d, 0x1a].includes(byte))) return null;
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: true });
  } catch {
    return new TextDecoder('latin1').decode(bytes);
  }
}

function isRowOf(line: string, delimiter: string | RegExp): boolean {
  const fields = line
    .trim()
    .split(delimiter)
    .map((field) => field.trim().replace(/^"(.*)"$/, '$1'));
  return fields.length >= 2 && fields.filter((field) => number.test(field)).length >= 2;
}

function hasTable(lines: string[], delimiter: string | RegExp): boolean {
  let inARow = 0;
  for (const line of lines) {
    inARow = isRowOf(line, delimiter) ? inARow + 1 : 0;
    if (inARow >= tableLines) return true;
  }
  return false;
}

/**
 * The type of a text file from its beginning: JCAMP-DX by its first label (`##TITLE=`, IUPAC), a table of numbers
 * by its lines, plain text otherwise; null when the bytes are no text. `complete` says that there is no more: then a
 * short file with fewer lines may be a table as well.
 */
export function sniffText(bytes: Uint8Array, complete: boolean): TextType | null {
  const text = decodeText(bytes);
  if (text === null || text.trim() === '') return null;
  if (/^\uFEFF?\s*(?:\$\$[^\n]*\n\s*)*##\s*TITLE\s*=/i.test(text)) return 'chemical/x-jcamp-dx';
  // The last line may be cut off in the middle.
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\n|\r/);
  if (!complete) lines.pop();
  if (hasTable(lines, '\t')) return 'text/tab-separated-values';
  if (hasTable(lines, ';') || hasTable(lines, ',') || hasTable(lines, /[ \t]+/)) return 'text/csv';
  const filled = lines.filter((line) => line.trim() !== '');
  const rows = filled.slice(1).filter((line) => [',', ';', '\t'].some((by) => isRowOf(line, by)));
  const short = complete && filled.length >= 3 && rows.length === filled.length - 1;
  if (short) return rows[0]!.includes('\t') ? 'text/tab-separated-values' : 'text/csv';
  return 'text/plain';
}
