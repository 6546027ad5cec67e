/** A piece of SQL with its values, in the order of its question marks. */
export type SqlPart = { sql: string; values: unknown[] };

export function joinParts(parts: readonly SqlPart[], glue: string): SqlPart {
  return { sql: parts.map((part) => part.sql).join(glue), values: parts.flatMap((part) => part.values) };
}

/**
 * The rows after (`key`, `id`) in a list that falls by `column` and then by id, empty values last. Written
 * as a range of the column and a filter in it, since MariaDB walks an index for this form, but scans the
 * table for a comparison of rows.
 */
export function afterFalling(column: string, idColumn: string, key: unknown, id: unknown): SqlPart {
  if (key === null) return { sql: `${column} IS NULL AND ${idColumn} < ?`, values: [id] };
  return {
    sql: `(${column} IS NULL OR ${column} <= ?) AND (${column} IS NULL OR ${column} < ? OR ${idColumn} < ?)`,
    values: [key, key, id],
  };
}

/** As above, for a column that is never empty. */
export function afterFallingFilled(column: string, idColumn: string, key: unknown, id: unknown): SqlPart {
  return { sql: `${column} <= ? AND (${column} < ? OR ${idColumn} < ?)`, values: [key, key, id] };
}

/** The rows after (`key`, `id`) in a list that rises by a column that is never empty and then by id. */
export function afterRising(column: string, idColumn: string, key: unknown, id: unknown): SqlPart {
  return { sql: `${column} >= ? AND (${column} > ? OR ${idColumn} > ?)`, values: [key, key, id] };
}

/** A text with LIKE's own signs made harmless, to be found anywhere. */
export function likeAnywhere(text: string): string {
  return `%${text.replace(/[\\%_]/g, '\\$&')}%`;
}

/** An instant as MariaDB writes it in UTC with milliseconds. */
export function sqlInstant(at: Date): string {
  return at.toISOString().replace('T', ' ').replace('Z', '');
}
