import { z } from 'zod';
import { Problem } from '@/lib/errors';
import { whyNotText } from './forbidden-characters';

/** Query parameters of every list. */
export const pageQuery = {
  limit: z.coerce.number().int().min(1).max(200).default(50).describe('rows in one answer, 1 to 200'),
  cursor: z.string().max(500).optional().describe('opaque: nextCursor of the answer before'),
};

export type Page<T> = { items: T[]; nextCursor: string | null };

/** A keyset position as an opaque text. `values` are the sort key's columns and the id of the last row. */
export function encodeCursor(sort: string, values: (string | number | null)[]): string {
  return Buffer.from(JSON.stringify([sort, ...values])).toString('base64url');
}

/** What may stand in a cursor, by the kind of its column. */
type CursorValues = {
  id: string;
  instant: string;
  text: string;
  number: number;
  'number or none': number | null;
};
export type CursorKind = keyof CursorValues;
type ValuesOf<K extends readonly CursorKind[]> = { -readonly [at in keyof K]: CursorValues[K[at]] };

/** ISO 8601 in UTC, or as MariaDB writes it. */
const instantPattern = /^\d{4}-\d\d-\d\d[T ]\d\d:\d\d:\d\d(?:\.\d{1,6})?Z?$/;

const isA: Record<CursorKind, (value: unknown) => boolean> = {
  id: (value) => z.uuid().safeParse(value).success,
  instant: (value) =>
    typeof value === 'string' && instantPattern.test(value) && !Number.isNaN(Date.parse(value)),
  text: (value) => typeof value === 'string' && whyNotText(value) === null,
  number: (value) => typeof value === 'number' && Number.isFinite(value),
  'number or none': (value) => value === null || (typeof value === 'number' && Number.isFinite(value)),
};
const isScalar = (value: unknown) => value === null || isA.number(value) || isA.text(value);

/**
 * The values of a cursor made for the same sort, each of its kind; 400 for anything else, since a cursor comes
 * back from outside. A count instead of kinds takes any text, number or null.
 */
export function decodeCursor<const K extends readonly CursorKind[]>(
  sort: string,
  cursor: string,
  kinds: K,
): ValuesOf<K>;
export function decodeCursor(sort: string, cursor: string, count: number): (string | number | null)[];
export function decodeCursor(
  sort: string,
  cursor: string,
  wanted: number | readonly CursorKind[],
): unknown[] {
  const read = readCursor(cursor);
  if (Array.isArray(read) && read[0] === sort) {
    const values = read.slice(1);
    const good =
      typeof wanted === 'number'
        ? values.length === wanted && values.every(isScalar)
        : values.length === wanted.length && wanted.every((kind, at) => isA[kind](values[at]));
    if (good) return values;
  }
  throw new Problem('malformed', 'This cursor does not belong to this list. Start again without a cursor.');
}

function readCursor(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    return null;
  }
}

/** Cuts `limit + 1` rows to a page. */
export function toPage<Row, T>(
  rows: Row[],
  limit: number,
  present: (row: Row) => T,
  cursorOf: (row: Row) => string,
): Page<T> {
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return {
    items: shown.map(present),
    nextCursor: rows.length > limit && last !== undefined ? cursorOf(last) : null,
  };
}
