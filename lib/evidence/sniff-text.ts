/** What a file is, seen from its first bytes, when it has no signature of a binary format. Pure. */
export type TextType = 'chemical/x-jcamp-dx' | 'text/csv' | 'text/tab-separated-values' | 'text/plain';

/** So many lines of numbers in a row make a table, wherever it begins: instruments write long headers. */
const tableLines = 8;
const number = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d+)?$/;

/** A byte-order mark of UTF-16, either way round (Unicode Standard, 23.8). */
export function hasUtf16Mark(bytes: Uint8Array): boolean {
  return (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
}

// Tab, line ends, form feed and the old end-of-file mark are the only control characters that text has.
const isNoText = (code: number) => code < 0x20 && ![0x09, 0x0a, 0x0c, 0x0d, 0x1a].includes(code);

/** Text of UTF-16 with its mark; null when control characters show that the mark was none. */
function decodeUtf16(bytes: Uint8Array): string | null {
  const text = new TextDecoder(bytes[0] === 0xff ? 'utf-16le' : 'utf-16be').decode(bytes, { stream: true });
  // Bytes of sound or of a picture make half characters and control characters within a few hundred signs.
  const start = text.slice(0, 2000);
  for (let at = 0; at < start.length; at++) if (isNoText(start.charCodeAt(at))) return null;
  return start.includes('\ufffd') ? null : text;
}

/** Text of the first bytes, by byte-order mark, else UTF-8, else Latin-1; null when they are no text. */
export function decodeText(bytes: Uint8Array): string | null {
  if (hasUtf16Mark(bytes)) return decodeUtf16(bytes);
  if (bytes.some(isNoText)) return null;
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
