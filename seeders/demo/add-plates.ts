import { type EvidenceFile, Fraction, Plate, PlatePhoto } from '@/lib/database/records';
import { changePlate } from '@/lib/evidence/tlc/change-plate';
import { markPlate } from '@/lib/evidence/tlc/mark-plate';
import type { LaneSubject, PlateBody } from '@/lib/evidence/tlc/schema';
import { drawPlate } from './draw-plate';
import type { LaidOutRun } from './lay-out-run';
import type { Team } from './people';
import { type DemoSubject, type DemoVisualiser, lanesOf, PHOTO, PLATE_MM, spotsOf } from './plate-layout';
import { INVENTED } from './run-plan';
import { sendFile } from './send-file';

const HOUR = 3_600_000;

function subjectOf(subject: DemoSubject, fractions: readonly Fraction[]): LaneSubject {
  if (subject.kind === 'crude') return { kind: 'crude' };
  if (subject.kind === 'reference') return { kind: 'reference', compound: subject.cas };
  return { kind: 'fraction', code: fractions[subject.number - 1]!.code };
}

function marksOf(laidOut: LaidOutRun, visualiser: DemoVisualiser, photo: EvidenceFile): PlateBody {
  const { plan, fractions } = laidOut;
  const line = (y: number) => [
    { x: PHOTO.marginPx, y },
    { x: PHOTO.widthPx - PHOTO.marginPx, y },
  ];
  return {
    evidenceId: photo.id,
    stationaryPhase: 'silica gel 60 F254 on aluminium',
    eluent: 'hexane and ethyl acetate, 9:1',
    visualiser,
    ...PLATE_MM,
    note: INVENTED,
    units: 'px',
    baseline: line(PHOTO.baselineY),
    front: line(PHOTO.frontY),
    lanes: lanesOf(plan).map((lane) => ({
      label: lane.label,
      x: lane.x,
      subject: subjectOf(lane.subject, fractions),
      spots: spotsOf(plan, lane, visualiser).map(({ x, y }) => ({ x, y })),
    })),
  };
}

async function photograph(team: Team, { plan, run }: LaidOutRun, visualiser: DemoVisualiser) {
  const spots = lanesOf(plan).flatMap((lane) => spotsOf(plan, lane, visualiser));
  return sendFile(
    team.chemist.actor,
    { run: run.code },
    {
      bytes: await drawPlate(plan.lot, visualiser, spots),
      fileName: `${run.code}_plate_${visualiser}_invented.jpg`,
      kind: 'plate-photo',
      takenAt: new Date(run.startedAt.getTime() + 7 * HOUR),
    },
  );
}

/** Draws, sends and marks the plate of a run, under each of its visualisers. What is marked already stays. */
export async function addPlates(team: Team, laidOut: LaidOutRun): Promise<void> {
  for (const visualiser of laidOut.plan.visualisers) {
    const photo = await photograph(team, laidOut, visualiser);
    if (await PlatePhoto.findOne({ where: { evidenceId: photo.id } })) continue;
    const body = marksOf(laidOut, visualiser, photo);
    const plate = await Plate.findOne({ where: { runId: laidOut.run.id } });
    if (plate) await changePlate(team.chemist.actor, plate.id, plate.version, body);
    else await markPlate(team.chemist.actor, laidOut.run.code, body);
  }
}
