import type { FractionListQuery } from './fraction-schema';
import { likeAnywhere, type SqlPart, sqlInstant } from './keyset';

export type FractionFilters = Omit<FractionListQuery, 'limit' | 'cursor' | 'sort' | 'compound' | 'group'>;

const dayMs = 86_400_000;
const isDay = (text: string) => /^\d{4}-\d{2}-\d{2}$/.test(text);

/** The first instant that counts: a day begins at midnight UTC. */
export function fromInstant(text: string): Date {
  return new Date(isDay(text) ? `${text}T00:00:00Z` : text);
}

/** The instant before which it still counts: a day counts to its end, a time to its millisecond. */
export function untilInstant(text: string): Date {
  return isDay(text) ? new Date(Date.parse(`${text}T00:00:00Z`) + dayMs) : new Date(Date.parse(text) + 1);
}

/** The filters as SQL over `fractions f`. Compound and group are resolved before. */
export function filterParts(filters: FractionFilters, compoundIds: string[] | null): SqlPart[] {
  const parts: SqlPart[] = [];
  const add = (sql: string, ...values: unknown[]) => parts.push({ sql, values });
  if (compoundIds) add('f.compoundId IN (?)', compoundIds);
  if (filters.run) add('f.runId = (SELECT id FROM runs WHERE code = ?)', filters.run);
  if (filters.cut) add('f.cut = ?', filters.cut);
  if (filters.status) add('f.status = ?', filters.status);
  if (filters.verdict) add('f.verdictState = ?', filters.verdict);
  if (filters.collectedFrom) add('f.collectedAt >= ?', sqlInstant(fromInstant(filters.collectedFrom)));
  if (filters.collectedTo) add('f.collectedAt < ?', sqlInstant(untilInstant(filters.collectedTo)));
  if (filters.purityMin !== undefined) add('f.purityPercent >= ?', filters.purityMin);
  if (filters.q) {
    const like = likeAnywhere(filters.q);
    add(
      `(f.code LIKE ? OR f.appearance LIKE ? OR f.storagePlace LIKE ?
        OR f.compoundId IN (SELECT id FROM compounds WHERE name LIKE ?)
        OR f.compoundId IN (SELECT compoundId FROM compound_synonyms WHERE name LIKE ?))`,
      like,
      like,
      like,
      like,
      like,
    );
  }
  return parts;
}
