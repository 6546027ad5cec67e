import { isSeeded, seedOnce } from '../seed-step';
import { addPlates } from './add-plates';
import { addTraces, isPastWork } from './add-traces';
import { fillTray } from './fill-tray';
import { finishFractions } from './finish-fractions';
import { requireInstruments } from './instruments';
import { layOutRun } from './lay-out-run';
import { requireStaff, type Team } from './people';
import { readIndex } from './read-index';
import type { RunPlan } from './run-plan';
import { SOLVENT_RUNS } from './runs-solvents';
import { TERPENE_RUNS } from './runs-terpenes';
import { writeSpecifications } from './specifications';

const DONE = 'demo laboratory';

async function layOut(plan: RunPlan, team: Team, today: Date): Promise<void> {
  const laidOut = await layOutRun(plan, team, today);
  await addPlates(team, laidOut);
  await addTraces(team, laidOut);
  for (const [at, cut] of plan.cuts.entries())
    if (cut.index && !(await isPastWork(laidOut.fractions[at]!)))
      await readIndex(team, laidOut, laidOut.fractions[at]!);
  await finishFractions(team, laidOut);
}

/**
 * Lays out the demo laboratory, once: two groups of invented people, a dozen runs with sixty fractions in every state,
 * and their evidence, all by the same commands that people's clicks call. Interrupted, it goes on where it stopped:
 * each step first looks whether it is done. People, measurements and limits are invented and say so.
 * @returns true where it was laid out now.
 */
export async function seedDemo(): Promise<boolean> {
  if (await isSeeded(DONE)) return false;
  const { admin, teams } = await requireStaff();
  await writeSpecifications(teams);
  const instrument = await requireInstruments(admin, teams.terpenes);
  // The day on which the groups were made, so that going on tomorrow gives the same laboratory.
  const today = teams.terpenes.group.createdAt;
  const plans = [...TERPENE_RUNS, ...SOLVENT_RUNS].sort((one, other) => other.daysAgo - one.daysAgo);
  for (const plan of plans) await layOut(plan, teams[plan.group], today);
  await fillTray(instrument, today);
  return seedOnce(DONE, 'laboratory.seeded', async () => ({ runs: plans.length, invented: true }));
}
