import { scanNumber, type ScannedNumber } from './csv-number';
import type { CsvProblem } from './csv-problem';

export interface RowOptions {
  /** Byte of the delimiter; 0x20 means any run of blanks. */
  delimiter: number;
  decimal: number;
  timeColumn: number;
  signalColumn: number;
  /** Line number (from 1) of the first row. */
  firstLine: number;
  /** False for a table without times: only the signal column is read. */
  readTime: boolean;
}

export interface Rows {
  time: Float64Array;
  signal: Float64Array;
}

const newline = 0x0a;
const carriageReturn = 0x0d;

function excerpt(bytes: Uint8Array, from: number, to: number): string {
  return String.fromCharCode(...bytes.subarray(from, Math.min(to, from + 30))).trim();
}

function grown(values: Float64Array): Float64Array<ArrayBuffer> {
  const larger = new Float64Array(Math.ceil(values.length * 1.5) + 16);
  larger.set(values);
  return larger;
}

/**
 * Reads two columns of a table of numbers from its bytes in one pass, without making text of it. Blank lines and lines
 * that begin with # are left out. Stops at the first thing that is wrong and names its line.
 */
export function scanRows(bytes: Uint8Array, start: number, options: RowOptions): Rows | CsvProblem {
  const { delimiter, decimal, timeColumn, signalColumn, readTime } = options;
  const blanks = delimiter === 0x20;
  const lastColumn = readTime ? Math.max(timeColumn, signalColumn) : signalColumn;
  const firstEnd = bytes.indexOf(newline, start);
  const firstLength = Math.max(4, (firstEnd < 0 ? bytes.length : firstEnd + 1) - start);
  let time = new Float64Array(Math.ceil((bytes.length - start) / firstLength) + 16);
  let signal = new Float64Array(time.length);
  let count = 0;
  let line = options.firstLine - 1;
  let before = -Infinity;
  const scanned: ScannedNumber = { value: 0, end: 0 };
  let i = start;
  while (i < bytes.length) {
    line++;
    const lineStart = i;
    let byte = bytes[i]!;
    while (i < bytes.length && (byte === 0x20 || (byte === 0x09 && blanks) || byte === carriageReturn))
      byte = bytes[++i]!;
    if (i >= bytes.length) break;
    if (byte === newline || byte === 0x23) {
      while (i < bytes.length && bytes[i] !== newline) i++;
      i++;
      continue;
    }
    let t = 0;
    let y = 0;
    for (let column = 0; ; column++) {
      byte = bytes[i]!;
      while (byte === 0x20 || byte === 0x22 || byte === 0x27 || (blanks && byte === 0x09)) byte = bytes[++i]!;
      if ((readTime && column === timeColumn) || column === signalColumn) {
        scanNumber(bytes, i, bytes.length, decimal, scanned);
        let end = scanned.end;
        byte = bytes[end]!;
        while (byte === 0x22 || byte === 0x27 || (byte === 0x20 && !blanks) || byte === carriageReturn)
          byte = bytes[++end]!;
        const closed =
          end >= bytes.length ||
          byte === newline ||
          byte === delimiter ||
          (blanks && (byte === 0x09 || byte === 0x20));
        if (scanned.end === i || !closed) return badCell(bytes, lineStart, i, line, column);
        // Too large for a float64, such as 1e999: the cell, not the line, is what has to be looked at.
        if (scanned.value - scanned.value !== 0)
          return badCell(bytes, lineStart, i, line, column, scanned.end);
        if (column === signalColumn) y = scanned.value;
        if (column === timeColumn) t = scanned.value;
        i = end;
      } else {
        while (i < bytes.length && byte !== delimiter && byte !== newline && !(blanks && byte === 0x09))
          byte = bytes[++i]!;
      }
      if (column === lastColumn) break;
      if (i >= bytes.length || bytes[i] === newline) return shortRow(bytes, i, line, lastColumn);
      i++;
    }
    while (i < bytes.length && bytes[i] !== newline) i++;
    i++;
    if (readTime) {
      if (t <= before) return timeProblem(t, before, line);
      before = t;
    }
    if (count === time.length) {
      time = grown(time);
      signal = grown(signal);
    }
    time[count] = t;
    signal[count++] = y;
  }
  return { time: time.subarray(0, count), signal: signal.subarray(0, count) };
}

function shortRow(bytes: Uint8Array, end: number, line: number, lastColumn: number): CsvProblem {
  if (end >= bytes.length || bytes.indexOf(newline, end + 1) < 0) {
    return {
      code: 'truncated',
      line,
      message: `Line ${line}, the last one, is cut off before column ${lastColumn + 1}. The file is not complete: export or copy it again.`,
    };
  }
  return {
    code: 'not a number',
    line,
    message: `Line ${line} has no column ${lastColumn + 1}. Correct that line, or choose other columns.`,
  };
}

function badCell(
  bytes: Uint8Array,
  lineStart: number,
  at: number,
  line: number,
  column: number,
  cellEnd?: number,
): CsvProblem {
  let end = cellEnd ?? at;
  while (cellEnd === undefined && end < bytes.length && bytes[end] !== newline) end++;
  const text = excerpt(bytes, at, end);
  const isLast = end >= bytes.length;
  if (text === '' && isLast) return shortRow(bytes, bytes.length, line, column);
  return {
    code: 'not a number',
    line,
    message:
      text === ''
        ? `Line ${line} has an empty cell in column ${column + 1}. Fill it in or cut the line out.`
        : `Line ${line}, column ${column + 1}: "${text}" is not a number. Correct or cut out that line, or choose another delimiter, decimal mark or column.`,
  };
}

function timeProblem(t: number, before: number, line: number): CsvProblem {
  if (t === before) {
    return {
      code: 'repeated time',
      line,
      message: `Line ${line} repeats the time ${t} of the line before. Export with more decimals, or cut the doubled line out.`,
    };
  }
  return {
    code: 'unsorted times',
    line,
    message: `The time on line ${line} (${t}) is earlier than the one before it (${before}). Sort the rows by time, or choose another time column.`,
  };
}
