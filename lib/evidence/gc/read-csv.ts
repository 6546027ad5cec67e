import {
  assumeTimeUnit,
  findColumn,
  guessColumns,
  minutesIn,
  timeUnitIn,
  type TimeUnit,
} from './csv-columns';
import { detectLayout, type CsvLayout, type DecimalMark, type Delimiter } from './csv-layout';
import type { CsvProblem, CsvProblemCode } from './csv-problem';
import { scanRows } from './csv-rows';
import { readTableBytes, type TextEncoding } from './csv-text';

/** What a person may say about a table instead of leaving it to be detected. Columns by number from 0 or by name. */
export interface CsvReadOptions {
  timeUnit?: TimeUnit;
  timeColumn?: number | string;
  signalColumn?: number | string;
  delimiter?: Delimiter;
  decimal?: DecimalMark;
  /** For a table without times: points per second. */
  samplingHz?: number;
}

export type CsvDetected = {
  delimiter: Delimiter;
  decimal: DecimalMark;
  encoding: TextEncoding;
  headerLines: number;
  /** Null when the times come from `samplingHz`. */
  timeColumn: number | null;
  signalColumn: number;
  timeUnit: TimeUnit;
  /** `assumed` when no heading told the unit: ask a person to confirm it. */
  timeUnitFrom: 'given' | 'heading' | 'assumed' | 'sampling';
  columns: string[];
};

export type CsvResult =
  | { ok: true; timeMin: Float64Array; signal: Float64Array; detected: CsvDetected }
  | { ok: false; problem: CsvProblem };

const linesLookedAt = 200;
const delimiterBytes: Record<Delimiter, number> = { ',': 0x2c, ';': 0x3b, tab: 0x09, space: 0x20, '|': 0x7c };

function refuse(code: CsvProblemCode, message: string, line: number | null = null): CsvResult {
  return { ok: false, problem: { code, message, line } };
}

function firstLines(bytes: Uint8Array, encoding: TextEncoding): { lines: string[]; starts: number[] } {
  const decoder = new TextDecoder(encoding.startsWith('utf-8') ? 'utf-8' : 'latin1');
  const lines: string[] = [];
  const starts: number[] = [];
  let at = 0;
  while (at < bytes.length && lines.length < linesLookedAt) {
    const end = bytes.indexOf(0x0a, at);
    const stop = end < 0 ? bytes.length : end;
    lines.push(decoder.decode(bytes.subarray(at, Math.min(stop, at + 4000))).replace(/\r$/, ''));
    starts.push(at);
    at = stop + 1;
  }
  return { lines, starts };
}

/** Old files end their lines with a lone carriage return; the scanner knows line feeds only. */
function withLineFeeds(bytes: Uint8Array): Uint8Array {
  if (bytes.indexOf(0x0a) >= 0 || bytes.indexOf(0x0d) < 0) return bytes;
  return bytes.map((byte) => (byte === 0x0d ? 0x0a : byte));
}

/** 0, 1, 2... or 1, 2, 3...: a count of points, not a time. */
function isIndex(time: Float64Array): boolean {
  if (time.length < 3 || (time[0] !== 0 && time[0] !== 1)) return false;
  for (let i = 1; i < time.length; i++) if (time[i]! - time[i - 1]! !== 1) return false;
  return true;
}

function chooseTimeUnit(
  layout: CsvLayout,
  timeColumn: number,
  lastTime: number,
  options: CsvReadOptions,
): { unit: TimeUnit; from: CsvDetected['timeUnitFrom'] } {
  if (options.timeUnit) return { unit: options.timeUnit, from: 'given' };
  const told =
    timeUnitIn(layout.named ? layout.columns[timeColumn]! : '') ?? timeUnitOfHeader(layout.headerText);
  return told ? { unit: told, from: 'heading' } : { unit: assumeTimeUnit(lastTime), from: 'assumed' };
}

/** A line of the heading that speaks of time and its unit, such as "Time unit: min" or a row of units. */
function timeUnitOfHeader(headerText: string): TimeUnit | null {
  for (const line of headerText.split('\n').reverse()) {
    if (/time|zeit|temps|tiempo|unit|einheit|retention/i.test(line) || /^\W*(min|s|sec|ms)\W/i.test(line)) {
      const unit = timeUnitIn(line);
      if (unit) return unit;
    }
  }
  return null;
}

/**
 * Reads a chromatogram from a table of time and signal. Delimiter, decimal mark, encoding, heading, columns and unit of time are
 * detected and returned, so that a person can confirm them; options override each. Signal keeps its own unit, times come
 * back in minutes. The bytes are read in one pass as float64, every point is kept.
 * Anything that is not a clean table is refused with the line and what to do about it; nothing is skipped silently.
 */
export function readCsvTrace(original: Uint8Array, options: CsvReadOptions = {}): CsvResult {
  const table = readTableBytes(original);
  const bytes = withLineFeeds(table.bytes);
  const { lines, starts } = firstLines(bytes, table.encoding);
  if (lines.every((line) => line.trim() === ''))
    return refuse('empty', 'The file is empty. Export the trace again.');
  if (bytes.subarray(0, 4096).includes(0)) {
    return refuse('not text', 'The file is not a text table. Export the trace as CSV, with one row a point.');
  }
  const layout = detectLayout(lines, starts, options);
  if (!layout) {
    return refuse(
      'no numbers',
      'No row of numbers was found. Choose the delimiter and the decimal mark, or export again as CSV.',
    );
  }
  return readRows(bytes, layout, table.encoding, options);
}

function readRows(
  bytes: Uint8Array,
  layout: CsvLayout,
  encoding: TextEncoding,
  options: CsvReadOptions,
): CsvResult {
  const { columns } = layout;
  const sampled = options.samplingHz !== undefined && options.samplingHz > 0;
  if (columns.length < 2 && !sampled) {
    return refuse(
      'one column',
      'The file has one column only, so no times. Give the sampling rate (samplingHz, points per second).',
    );
  }
  const guess = guessColumns(layout);
  let timeColumn = options.timeColumn === undefined ? guess.time : findColumn(columns, options.timeColumn);
  let signalColumn =
    options.signalColumn === undefined ? guess.signal : findColumn(columns, options.signalColumn);
  if (options.signalColumn === undefined && signalColumn === timeColumn && columns.length > 1 && !sampled) {
    signalColumn = timeColumn === 0 ? 1 : 0;
  } else if (options.timeColumn === undefined && signalColumn === timeColumn && columns.length > 1) {
    timeColumn = signalColumn === 0 ? 1 : 0;
  }
  if (timeColumn < 0 || signalColumn < 0) {
    const wanted = timeColumn < 0 ? options.timeColumn : options.signalColumn;
    return refuse(
      'no such column',
      `There is no column ${JSON.stringify(wanted)}. The file has: ${columns.join(', ')}.`,
    );
  }
  const rows = scanRows(bytes, layout.dataStart, {
    delimiter: delimiterBytes[layout.delimiter],
    decimal: layout.decimal === ',' ? 0x2c : 0x2e,
    timeColumn,
    signalColumn,
    firstLine: layout.headerLines + 1,
    readTime: !sampled,
  });
  if ('code' in rows) return { ok: false, problem: rows };
  if (rows.signal.length < 2)
    return refuse('too few points', 'The file holds fewer than two points. Export the whole trace.');

  const { time, signal } = rows;
  const detected = { ...layoutFacts(layout), encoding, signalColumn };
  if (sampled) {
    const minutesPerPoint = 1 / (60 * options.samplingHz!);
    for (let i = 0; i < time.length; i++) time[i] = i * minutesPerPoint;
    return {
      ok: true,
      timeMin: time,
      signal,
      detected: { ...detected, timeColumn: null, timeUnit: 'min', timeUnitFrom: 'sampling' },
    };
  }
  const unit = chooseTimeUnit(layout, timeColumn, time[time.length - 1]!, options);
  if (unit.from === 'assumed' && isIndex(time)) {
    return refuse(
      'no time axis',
      `Column ${timeColumn + 1} only counts the points. Give the sampling rate (samplingHz, points per second), or the unit (timeUnit) if the count really is a time.`,
      layout.headerLines + 1,
    );
  }
  const factor = minutesIn[unit.unit];
  // Division by 60 keeps 90 s exactly 1.5 min; multiplying by 1/60 would not.
  if (unit.unit === 's' || unit.unit === 'ms')
    for (let i = 0; i < time.length; i++) time[i]! /= unit.unit === 's' ? 60 : 60_000;
  else if (factor !== 1) for (let i = 0; i < time.length; i++) time[i]! *= factor;
  return {
    ok: true,
    timeMin: time,
    signal,
    detected: { ...detected, timeColumn, timeUnit: unit.unit, timeUnitFrom: unit.from },
  };
}

function layoutFacts(
  layout: CsvLayout,
): Pick<CsvDetected, 'delimiter' | 'decimal' | 'headerLines' | 'columns'> {
  const { delimiter, decimal, headerLines, columns } = layout;
  return { delimiter, decimal, headerLines, columns };
}
