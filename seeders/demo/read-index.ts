import { findPreferredLiterature } from '@/lib/compounds/find-literature';
import { Compound, type Fraction, RefractiveReading } from '@/lib/database/records';
import { addRefractiveReading } from '@/lib/evidence/refractive-index/add-refractive-reading';
import { waterIndex } from '@/lib/evidence/refractive-index/water-check';
import type { LaidOutRun } from './lay-out-run';
import type { Team } from './people';
import { chanceFor } from './random';
import type { Composition } from './run-plan';

const FALL_PER_C = 4.5e-4;

/** Index of the mixture at the temperature at which its main component's literature value holds. */
async function indexOf(
  composition: Composition,
  target: string,
): Promise<{ n: number; temperatureC: number }> {
  const literature = async (cas: string) => {
    const compound = await Compound.findOne({ where: { casNumber: cas }, rejectOnEmpty: true });
    const row = await findPreferredLiterature(compound.id, 'refractive index');
    if (row?.value == null || row.temperatureC === null)
      throw new Error(`No refractive index is kept for ${compound.name}.`);
    return { n: row.value, temperatureC: row.temperatureC };
  };
  const { temperatureC } = await literature(target);
  let n = 0;
  for (const [cas, percent] of Object.entries(composition)) {
    const own = await literature(cas);
    n += (percent / 100) * (own.n + FALL_PER_C * (own.temperatureC - temperatureC));
  }
  return { n, temperatureC };
}

const fourPlaces = (value: number) => Math.round(value * 10_000) / 10_000;

/** Three readings of a fraction with an invented scatter of 0.00006, and the water check, by the chemist. */
export async function readIndex(
  team: Team,
  { plan }: LaidOutRun,
  fraction: Fraction,
  repeat: 'first' | 'second' = 'first',
): Promise<void> {
  if ((await RefractiveReading.count({ where: { fractionId: fraction.id } })) >= (repeat === 'first' ? 1 : 2))
    return;
  const cut = plan.cuts[fraction.number - 1]!;
  const chance = chanceFor(`index ${plan.lot} ${fraction.number} ${repeat}`);
  const { n, temperatureC } = await indexOf(cut.composition, plan.target);
  const prismC = Math.round((temperatureC + 0.6 * (chance.uniform() - 0.5)) * 10) / 10;
  const read = () => fourPlaces(n - FALL_PER_C * (prismC - temperatureC) + 0.00006 * chance.normal());
  const waterTemperatureC = Math.min(30, Math.max(15, prismC));
  await addRefractiveReading(team.chemist.actor, fraction.code, {
    readings: [read(), read(), read()],
    temperatureC: prismC,
    wavelengthNm: 589.3,
    waterReading: fourPlaces(waterIndex(waterTemperatureC) + 0.00004 * chance.normal()),
    waterTemperatureC,
    instrument: 'Refractometer 1 (invented)',
  });
}
