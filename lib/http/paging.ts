import { z } from 'zod';
import { Problem } from '@/lib/errors';

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

/** The values of a cursor made for the same sort; 400 for anything else. */
export function decodeCursor(sort: string, cursor: string, count: number): (string | number | null)[] {
  try {
    const [madeFor, ...values] = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')) as [
      string,
      ...(string | number | null)[],
    ];
    if (madeFor === sort && values.length === count) return values;
  } catch {
    // falls through to the one answer for every bad cursor
  }
  throw new Problem('malformed', 'This cursor does not belong to this list. Start again without a cursor.');
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
