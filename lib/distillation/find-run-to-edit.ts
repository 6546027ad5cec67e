import type { Actor } from '@/lib/auth/actor';
import { Fraction } from '@/lib/database/records';
import { presentRun } from './present';
import { requireRun } from './require-run';
import type { RunJson } from './schema';

/** A run with the codes of its signed-off fractions, whose signatures some changes end; 404 as requireRun. */
export async function findRunToEdit(
  actor: Actor,
  code: string,
): Promise<{ run: RunJson; signedOff: string[] }> {
  const run = await requireRun(actor, code);
  const signed = await Fraction.findAll({
    where: { runId: run.id, status: 'signed off' },
    attributes: ['code'],
    order: [['number', 'ASC']],
  });
  return { run: presentRun(run), signedOff: signed.map((fraction) => fraction.code) };
}
