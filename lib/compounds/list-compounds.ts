import { QueryTypes } from 'sequelize';
import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { database } from '@/lib/database/connection';
import { Compound, CompoundSynonym, LiteratureValue } from '@/lib/database/records';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { parseCompoundSearch } from './compound-search';
import { presentCompoundRow } from './present';
import type { CompoundListQuery, CompoundRow } from './schema';

interface Found {
  id: string;
  name: string;
  matchRank: number;
}

/** 0: the text begins a name or is a number, key or formula of the compound; 1: it stands inside a name. */
const RANKED = `
  SELECT c.id, c.name, CASE
    WHEN c.name LIKE :prefix OR c.casNumber LIKE :cas OR c.inchiKey LIKE :inchiKey OR c.formula = :formula
      OR EXISTS (SELECT 1 FROM compound_synonyms s WHERE s.compoundId = c.id AND s.name LIKE :prefix) THEN 0
    ELSE 1 END AS matchRank
  FROM compounds c
  WHERE c.name LIKE :infix OR c.casNumber LIKE :cas OR c.inchiKey LIKE :inchiKey OR c.formula = :formula
    OR EXISTS (SELECT 1 FROM compound_synonyms s WHERE s.compoundId = c.id AND s.name LIKE :infix)`;
const ALL = 'SELECT c.id, c.name, 0 AS matchRank FROM compounds c';

async function findIds({ q, cursor, limit }: CompoundListQuery): Promise<Found[]> {
  // The cursor holds the id and not the name, which may be long: names are unique, so the id stands for one.
  const [matchRank, lastId] = cursor ? decodeCursor('compounds', cursor, ['number', 'id']) : [];
  const after = cursor
    ? 'WHERE f.matchRank >= :matchRank AND (f.matchRank > :matchRank OR f.name > (SELECT l.name FROM compounds l WHERE l.id = :lastId))'
    : '';
  return database().query<Found>(
    `SELECT f.id, f.name, f.matchRank FROM (${q ? RANKED : ALL}) f ${after} ORDER BY f.matchRank, f.name LIMIT :rows`,
    {
      replacements: { ...(q && parseCompoundSearch(q)), matchRank, lastId, rows: limit + 1 },
      type: QueryTypes.SELECT,
    },
  );
}

/** The compounds that a text finds by name, synonym, CAS number, InChIKey or formula; all of them without a text. */
export async function listCompounds(actor: Actor, query: CompoundListQuery): Promise<Page<CompoundRow>> {
  requirePerson(actor);
  const found = await findIds(query);
  const ids = found.map(({ id }) => id);
  const [compounds, synonyms, boilingPoints] = await Promise.all([
    Compound.findAll({ where: { id: ids } }),
    CompoundSynonym.findAll({ where: { compoundId: ids }, order: [['name', 'ASC']] }),
    LiteratureValue.findAll({
      where: { compoundId: ids, property: 'normal boiling point', preferred: true, replacedAt: null },
    }),
  ]);
  const byId = new Map(compounds.map((compound) => [compound.id, compound]));
  return toPage(
    found.filter(({ id }) => byId.has(id)),
    query.limit,
    ({ id }) =>
      presentCompoundRow(
        byId.get(id)!,
        synonyms.filter((synonym) => synonym.compoundId === id),
        boilingPoints.find((row) => row.compoundId === id) ?? null,
      ),
    ({ matchRank, id }) => encodeCursor('compounds', [matchRank, id]),
  );
}
