import { QueryTypes } from 'sequelize';
import { findVapourPressureData } from '@/lib/compounds/vapour-pressure-data';
import type { Actor } from '@/lib/auth/actor';
import { database } from '@/lib/database/connection';
import { Compound, Fraction, Plate, PlatePhoto, Run, User, Verdict } from '@/lib/database/records';
import { STANDARD_ATMOSPHERE_MBAR } from '@/lib/units/pressure';
import { boilingPointAtPressure } from './boiling-point/boiling-point-at-pressure';
import { evidenceMarks, type EvidenceMarks } from './evidence-marks';
import { findCautions } from './find-cautions';
import type { FractionJson } from './fraction-schema';
import { type CurveReading, headCurve } from './head-curve';
import { presentFraction, presentRun } from './present';
import type { FractionWithRun } from './require-fraction';
import { requireRun } from './require-run';
import { runMassBalance } from './run-mass-balance';

export type FractionOnSheet = FractionJson & { evidence: EvidenceMarks };
export type ExpectedBoiling = {
  boilingPointC: number;
  uncertaintyC: number;
  pressureMbar: number;
  source: string;
};

/** Everything that the page of a run shows; 404 for a run that the actor may not see. */
export async function findRunSheet(actor: Actor, code: string) {
  const run = await requireRun(actor, code);
  const [fractions, readings, plates, expected, cautions] = await Promise.all([
    fractionsOf(run.id),
    curveReadings(run.id),
    platesOf(run.id),
    expectedBoiling(run),
    findCautions({
      compoundIds: [run.targetCompoundId, ...run.impurities.map((compound) => compound.id)],
      heatingTemperatureC: run.bathTemperatureC ?? null,
      pressureMbar: run.plannedPressureMbar ?? null,
    }),
  ]);
  return {
    run: presentRun(run),
    fractions,
    curve: headCurve(
      readings,
      fractions.map((fraction) => ({ ...fraction, collectedAt: new Date(fraction.collectedAt) })),
      run.endedAt ?? null,
    ),
    balance: runMassBalance({ ...run.get(), residueMassG: run.residueMassG ?? null }, fractions),
    plates,
    expected,
    cautions,
  };
}
export type RunSheet = Awaited<ReturnType<typeof findRunSheet>>;

async function fractionsOf(runId: string): Promise<FractionOnSheet[]> {
  const fractions = (await Fraction.findAll({
    where: { runId },
    include: [
      { model: Run, as: 'run' },
      { model: Compound, as: 'compound' },
      { model: User, as: 'collectedBy' },
    ],
    order: [['number', 'ASC']],
  })) as FractionWithRun[];
  const verdictIds = fractions.flatMap((fraction) => fraction.verdictId ?? []);
  const verdicts = await Verdict.findAll({ where: { id: verdictIds } });
  const criteriaOf = new Map(verdicts.map((verdict) => [verdict.id, verdict.criteria]));
  return fractions.map((fraction) => ({
    ...presentFraction(fraction),
    evidence: evidenceMarks(criteriaOf.get(fraction.verdictId ?? '')),
  }));
}

/** At most some 2,000 readings, evenly taken: a curve of a few hundred pixels needs no more. */
async function curveReadings(runId: string): Promise<CurveReading[]> {
  const rows = await database().query<{ at: Date; headTemperatureC: number; volumeMl: number | null }>(
    `SELECT at, headTemperatureC, volumeMl FROM (
       SELECT at, headTemperatureC, volumeMl, ROW_NUMBER() OVER (ORDER BY at, id) AS place, COUNT(*) OVER () AS total
       FROM log_readings WHERE runId = ? AND headTemperatureC IS NOT NULL
     ) numbered WHERE MOD(place - 1, CEIL(total / 2000)) = 0 ORDER BY place`,
    { replacements: [runId], type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, at: new Date(row.at) }));
}

async function platesOf(runId: string) {
  const plates = (await Plate.findAll({
    where: { runId },
    include: [{ model: PlatePhoto, as: 'photos' }],
    order: [['createdAt', 'ASC']],
  })) as (Plate & { photos: PlatePhoto[] })[];
  return plates.map((plate) => ({
    id: plate.id,
    stationaryPhase: plate.stationaryPhase,
    eluent: plate.eluent,
    visualisers: plate.photos.map((photo) => photo.visualiser),
    photo: plate.photos[0]?.evidenceId ?? null,
    createdAt: (plate.createdAt as Date).toISOString(),
  }));
}

/** Null where the boiling point is not known, or where the technique boils a mixture with water or an entrainer. */
async function expectedBoiling(run: Run): Promise<ExpectedBoiling | null> {
  if (run.technique === 'steam' || run.technique === 'azeotropic') return null;
  const data = await findVapourPressureData(run.targetCompoundId);
  if (!data) return null;
  const pressureMbar = run.plannedPressureMbar ?? STANDARD_ATMOSPHERE_MBAR;
  try {
    const { boilingPointC, uncertaintyC, source } = boilingPointAtPressure(data, pressureMbar);
    return { boilingPointC, uncertaintyC, pressureMbar, source };
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
