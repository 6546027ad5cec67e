import { findVapourPressureData } from '@/lib/compounds/vapour-pressure-data';
import { Compound } from '@/lib/database/records';
import { boilingPointAtPressure } from '@/lib/distillation/boiling-point/boiling-point-at-pressure';
import type { Chance } from './random';
import type { Composition, CutPlan, RunPlan } from './run-plan';

const known = new Map<string, number>();

async function boilsAtC(cas: string, pressureMbar: number): Promise<number> {
  const key = `${cas} ${pressureMbar}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const compound = await Compound.findOne({ where: { casNumber: cas }, rejectOnEmpty: true });
  const data = await findVapourPressureData(compound.id);
  if (!data) throw new Error(`No boiling point is kept for ${compound.name}.`);
  const { boilingPointC } = boilingPointAtPressure(data, pressureMbar);
  known.set(key, boilingPointC);
  return boilingPointC;
}

/** Mean of the boiling points at the pressure, by composition: enough for a picture of a run. */
async function meanBoilingPointC(composition: Composition, pressureMbar: number): Promise<number> {
  let sum = 0;
  let total = 0;
  for (const [cas, percent] of Object.entries(composition)) {
    sum += percent * (await boilsAtC(cas, pressureMbar));
    total += percent;
  }
  return sum / total;
}

const round = (value: number) => Math.round(value * 10) / 10;

/** How much of the neighbouring cut shows at the ends of a cut. */
const NEIGHBOUR = 0.12;

/**
 * Head temperatures at the start and the end of each cut, °C, rising, from the vapour pressures of what came over at
 * the pressure of the run, with an invented scatter of 0.15 °C. Null for what never passed the head.
 */
export async function headTemperatures(
  { cuts, pressureMbar }: RunPlan,
  chance: Chance,
): Promise<({ fromC: number; toC: number } | null)[]> {
  const passed = cuts.filter(passesHead);
  const means = await Promise.all(passed.map((cut) => meanBoilingPointC(cut.composition, pressureMbar)));
  let last = -Infinity;
  return cuts.map((cut) => {
    const at = passed.indexOf(cut);
    if (at < 0) return null;
    const mean = means[at]!;
    const towards = (other: number | undefined) => mean + NEIGHBOUR * ((other ?? mean) - mean);
    const [from, to] = cut.headC ?? [
      at === 0 ? mean - 1.4 : towards(passed[at - 1]?.headC ? mean - 2 : means[at - 1]),
      towards(means[at + 1]),
    ];
    const fromC = round(Math.max(last, from + 0.15 * chance.normal()));
    const toC = round(Math.max(fromC + 0.1, to + 0.15 * chance.normal()));
    last = toC;
    return { fromC, toC };
  });
}

/** What boils over passes the thermometer; a trap's and the still's content does not. */
export function passesHead({ cut }: CutPlan): boolean {
  return cut !== 'residue' && cut !== 'trap';
}
