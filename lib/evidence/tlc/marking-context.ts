import type { Actor } from '@/lib/auth/actor';
import { whyNot } from '@/lib/auth/authorise';
import { Fraction, Run } from '@/lib/database/records';
import { requireRun } from '@/lib/distillation/require-run';
import { notFound } from '@/lib/errors';
import { listEvidenceOfRun } from '../list-evidence';
import type { EvidenceView } from '../schema';
import { loadPlate } from './load-plate';
import { requirePlate } from './require-plate';
import type { PlateView } from './schema';

export type MarkingContext = {
  run: { code: string; target: string };
  fractions: { code: string; cut: string }[];
  /** Plate photos of the run, the newest first. */
  photos: EvidenceView[];
  /** Why the actor may not mark, or null. */
  whyNot: string | null;
};

/** What the page for marking needs of a run. 404 for one that the actor may not see. */
export async function markingContext(actor: Actor, runCode: string): Promise<MarkingContext> {
  const run = await requireRun(actor, runCode);
  const [fractions, photos] = await Promise.all([
    Fraction.findAll({ where: { runId: run.id }, attributes: ['code', 'cut'], order: [['number', 'ASC']] }),
    listEvidenceOfRun(actor, run.id, 'plate-photo'),
  ]);
  return {
    run: { code: run.code, target: run.target.name },
    fractions: fractions.map(({ code, cut }) => ({ code, cut })),
    photos,
    whyNot: whyNot(actor, 'plate.write', run.groupId),
  };
}

/** The same for a plate that is there. */
export async function plateContext(
  actor: Actor,
  id: string,
): Promise<{ plate: PlateView; context: MarkingContext }> {
  const plate = await requirePlate(actor, id);
  const run = await Run.findByPk(plate.runId, { attributes: ['code'] });
  if (!run) throw notFound('plate with this id');
  return { plate: await loadPlate(plate), context: await markingContext(actor, run.code) };
}
