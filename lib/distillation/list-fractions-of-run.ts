import type { Actor } from '@/lib/auth/actor';
import { Op } from 'sequelize';
import { Compound, Fraction, Run, User } from '@/lib/database/records';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import type { FractionJson } from './fraction-schema';
import { requirePerson } from '@/lib/auth/require-person';
import { presentFraction } from './present';
import type { FractionWithRun } from './require-fraction';
import { requireRun } from './require-run';

/** The fractions of one run in the order of their numbers; 404 for a run that is not visible. */
export async function listFractionsOfRun(
  actor: Actor,
  runCode: string,
  { limit, cursor }: { limit: number; cursor?: string },
): Promise<Page<FractionJson>> {
  const run = await requireRun(requirePerson(actor), runCode);
  const from = cursor === undefined ? 0 : decodeCursor('number', cursor, ['number'])[0];
  const rows = await Fraction.findAll({
    where: { runId: run.id, number: { [Op.gt]: from } },
    include: [
      { model: Run, as: 'run' },
      { model: Compound, as: 'compound' },
      { model: User, as: 'collectedBy' },
    ],
    order: [['number', 'ASC']],
    limit: limit + 1,
  });
  return toPage(rows as FractionWithRun[], limit, presentFraction, (row) =>
    encodeCursor('number', [row.number]),
  );
}
