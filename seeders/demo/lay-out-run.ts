import { Fraction, LogReading, Run } from '@/lib/database/records';
import { addReadings } from '@/lib/distillation/add-readings';
import { createFraction } from '@/lib/distillation/create-fraction';
import { createRun } from '@/lib/distillation/create-run';
import type { NewReading } from '@/lib/distillation/reading-schema';
import { safetyCheckNames } from '@/lib/distillation/safety-checks';
import { headTemperatures, passesHead } from './head-temperature';
import type { Team } from './people';
import { chanceFor } from './random';
import type { RunPlan } from './run-plan';
import { requireSubstance } from './substances';

const HOUR = 3_600_000;
const MINUTE = 60_000;
/** Mean of the liquids here; readings of volume are to a millilitre. */
const DENSITY_G_ML = 0.88;

export interface LaidOutRun {
  plan: RunPlan;
  run: Run;
  /** In the order of the plan's cuts. */
  fractions: Fraction[];
}

/** Start of the run: the morning of its day, counted from the day on which the laboratory was laid out. */
function startOf(plan: RunPlan, today: Date): Date {
  if (plan.running) return new Date(today.getTime() - 3 * HOUR);
  const day = new Date(today.getTime() - plan.daysAgo * 24 * HOUR);
  return new Date(Date.UTC(day.getUTCFullYear(), day.getUTCMonth(), day.getUTCDate(), 7, 40));
}

async function requireRun(plan: RunPlan, team: Team, startedAt: Date): Promise<Run> {
  const where = { groupId: team.group.id, chargeLot: plan.lot };
  const found = await Run.findOne({ where });
  if (found) return found;
  await createRun(team.chemist.actor, {
    targetCompound: plan.target,
    knownImpurities: [...plan.impurities],
    technique: plan.technique,
    chargeMassG: plan.chargeMassG,
    chargeSource: plan.chargeSource,
    chargeLot: plan.lot,
    columnStages: plan.columnStages ?? null,
    bath: 'oil bath, stirred',
    plannedPressureMbar: plan.pressureMbar,
    safetyChecks: Object.fromEntries(safetyCheckNames.map((name) => [name, true])),
    residueMassG: plan.residueMassG ?? null,
    note: plan.note,
    startedAt: startedAt.toISOString(),
    endedAt: plan.running ? null : new Date(startedAt.getTime() + 6.5 * HOUR).toISOString(),
    group: team.group.id,
  });
  return Run.findOne({ where, rejectOnEmpty: true });
}

/** Minutes after the start at which each cut began: ten minutes of warming, then by mass. */
function cutStarts({ cuts, running }: RunPlan): number[] {
  const whole = running ? 150 : 330;
  const total = cuts.filter(passesHead).reduce((sum, { massG }) => sum + massG, 0);
  let at = 25;
  return cuts.map((cut) => {
    const start = at;
    if (passesHead(cut)) at += (whole * cut.massG) / total;
    return start;
  });
}

/** Lays out a run with its fractions and log readings, by its chemist. What is there already stays. */
export async function layOutRun(plan: RunPlan, team: Team, today: Date): Promise<LaidOutRun> {
  const chance = chanceFor(`run ${plan.lot}`);
  const startedAt = startOf(plan, today);
  const run = await requireRun(plan, team, startedAt);
  const heads = await headTemperatures(plan, chance);
  const starts = cutStarts(plan);
  for (const [at, cut] of plan.cuts.entries()) {
    const head = heads[at];
    const tareMassG = Math.round((60 + 40 * chance.uniform()) * 100) / 100;
    const last = plan.running && at === plan.cuts.length - 1;
    if (await Fraction.findOne({ where: { runId: run.id, number: at + 1 } })) continue;
    await createFraction(team.chemist.actor, run.code, {
      cut: cut.cut,
      headTemperatureFromC: head?.fromC ?? null,
      headTemperatureToC: last ? null : (head?.toC ?? null),
      pressureMbar: passesHead(cut) ? plan.pressureMbar : null,
      tareMassG,
      grossMassG: last ? null : Math.round((tareMassG + cut.massG) * 100) / 100,
      appearance: cut.appearance ?? 'clear, colourless',
      storagePlace:
        cut.cut === 'heart' ? `solvent cabinet ${plan.group === 'terpenes' ? 'B' : 'D'}, shelf 2` : null,
      collectedAt: new Date(startedAt.getTime() + starts[at]! * MINUTE).toISOString(),
    });
  }
  if ((await LogReading.count({ where: { runId: run.id } })) === 0)
    await addReadings(team.chemist.actor, run.code, logReadings(plan, startedAt, heads, starts));
  const fractions = await Fraction.findAll({ where: { runId: run.id }, order: [['number', 'ASC']] });
  return { plan, run, fractions };
}

/** Eight readings a cut: head temperature, bath, pressure and the volume so far. */
function logReadings(
  plan: RunPlan,
  startedAt: Date,
  heads: ({ fromC: number; toC: number } | null)[],
  starts: number[],
): NewReading[] {
  const chance = chanceFor(`log ${plan.lot}`);
  const readings: NewReading[] = [];
  let volumeMl = 0;
  for (const [at, cut] of plan.cuts.entries()) {
    const head = heads[at];
    if (!head) continue;
    const end = starts.slice(at + 1).find((start) => start > starts[at]!) ?? starts[at]! + 40;
    const steps = 8;
    for (let step = 0; step < steps; step += 1) {
      const share = step / steps;
      const minutes = starts[at]! + share * (end - starts[at]!);
      const headTemperatureC = head.fromC + share * (head.toC - head.fromC) + 0.1 * chance.normal();
      readings.push({
        at: new Date(startedAt.getTime() + minutes * MINUTE).toISOString(),
        headTemperatureC: Math.round(headTemperatureC * 10) / 10,
        bathTemperatureC: Math.round(head.toC + 34 + 8 * share + chance.normal()),
        pressureMbar: Math.round(plan.pressureMbar * (1 + 0.008 * chance.normal()) * 10) / 10,
        volumeMl: Math.round(volumeMl + (share * cut.massG) / DENSITY_G_ML),
        ...(step === 0 && { note: `${cut.cut}: receiver changed` }),
      });
    }
    volumeMl += cut.massG / DENSITY_G_ML;
  }
  return readings;
}

/** The name of the run's target, for file names. */
export function targetName({ target }: RunPlan): string {
  return requireSubstance(target).name.replace(/[^a-z]/gi, '');
}
