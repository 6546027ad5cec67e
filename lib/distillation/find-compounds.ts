import { QueryTypes } from 'sequelize';
import { parseCasNumber } from '@/lib/compounds/cas-number';
import { database } from '@/lib/database/connection';
import { isId } from '@/lib/database/ids';
import { likeAnywhere } from './keyset';

/** The ids that a filter means: an id, a CAS number, or a part of a name or synonym. None for the unknown. */
export async function findCompoundIds(reference: string): Promise<string[]> {
  if (isId(reference)) return [reference];
  const casNumber = parseCasNumber(reference);
  const like = likeAnywhere(reference);
  const rows = await database().query<{ id: string }>(
    casNumber
      ? 'SELECT id FROM compounds WHERE casNumber = ?'
      : `SELECT id FROM compounds WHERE name LIKE ?
         UNION SELECT compoundId AS id FROM compound_synonyms WHERE name LIKE ? LIMIT 500`,
    { replacements: casNumber ? [casNumber] : [like, like], type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.id);
}
