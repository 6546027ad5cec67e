import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { type Recorder, recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { type Fraction, Plate, type Run } from '@/lib/database/records';
import { whyNotInState } from '@/lib/distillation/fraction-states';
import { requireRunForChange } from '@/lib/distillation/require-run';
import { Problem } from '@/lib/errors';
import { auditFacts } from './audit-facts';
import { checkMarks } from './check-marks';
import { loadPlate } from './load-plate';
import { requirePlatePhoto } from './require-plate-photo';
import { resolveSubjects } from './resolve-subjects';
import type { PlateBody, PlateView } from './schema';
import { visualiserId } from './visualiser-name';
import { writeMarks } from './write-marks';

/** Every fraction that a lane names, or named, has changed with the plate. The rows must be locked. */
export async function tellFractions(recorder: Recorder, fractions: Fraction[], what: string): Promise<void> {
  for (const fraction of fractions) {
    const why = whyNotInState('change', fraction.status);
    if (why) throw new Problem('state-conflict', `${fraction.code}: ${why}`);
    await fractionChanged(recorder, fraction, what);
  }
}

export function requirePerson(actor: Actor): string {
  if (actor.kind !== 'user')
    throw new Problem('not-allowed', 'A plate is marked by a person, not by an instrument.');
  return actor.userId;
}

/** Looks at, locks and writes the marks of one photo; used for a new plate and for a changed one. */
export async function putMarks(
  recorder: Recorder,
  run: Run,
  plate: Plate,
  body: PlateBody,
  namedBefore: string[] = [],
): Promise<Fraction[]> {
  const { transaction } = recorder;
  const { subjects, fractions } = await resolveSubjects(run, body.lanes, transaction, namedBefore);
  const photo = await requirePlatePhoto(recorder, run, body.evidenceId);
  const known = { ...body, visualiser: visualiserId(body.visualiser) };
  await writeMarks(plate, { body: known, checked: checkMarks(known, photo), subjects }, transaction);
  return fractions;
}

/** Marks a plate of a run. 404, 403, or 422 that names the marks that are wrong. */
export async function markPlate(actor: Actor, runCode: string, body: PlateBody): Promise<PlateView> {
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const run = await requireRunForChange(actor, runCode, transaction);
    authorise(actor, 'plate.write', run.groupId);
    const plate = await Plate.create(
      {
        id: newId(),
        groupId: run.groupId,
        runId: run.id,
        stationaryPhase: body.stationaryPhase,
        eluent: body.eluent,
        widthMm: body.widthMm ?? null,
        heightMm: body.heightMm ?? null,
        note: body.note ?? null,
        markedById: requirePerson(actor),
      },
      { transaction },
    );
    const fractions = await putMarks(recorder, run, plate, body);
    const view = await loadPlate(plate, transaction);
    record({
      type: 'plate.marked',
      recordType: 'plate',
      recordId: plate.id,
      groupId: run.groupId,
      after: auditFacts(view),
    });
    await tellFractions(recorder, fractions, 'plate marked');
    return view;
  });
}
