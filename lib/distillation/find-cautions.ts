import { listLiteratureInForce } from '@/lib/compounds/find-literature';
import { Compound } from '@/lib/database/records';
import { STANDARD_ATMOSPHERE_MBAR } from '@/lib/units/pressure';
import { type Caution, type HazardousLiquid, listCautions } from './cautions';

export type PlannedStill = {
  compoundIds: readonly string[];
  heatingTemperatureC: number | null;
  /** Null for the air's pressure. */
  pressureMbar: number | null;
};

/** The usual cautions for distilling these compounds, from their recorded hazards. Unknown ids are left out. */
export async function findCautions(still: PlannedStill): Promise<Caution[]> {
  return listCautions({
    liquids: await findHazards(still.compoundIds),
    heatingTemperatureC: still.heatingTemperatureC,
    pressureMbar: still.pressureMbar ?? STANDARD_ATMOSPHERE_MBAR,
  });
}

async function findHazards(compoundIds: readonly string[]): Promise<HazardousLiquid[]> {
  const compounds = await Compound.findAll({ where: { id: [...compoundIds] }, order: [['name', 'ASC']] });
  const values = await listLiteratureInForce(
    compounds.map((compound) => compound.id),
    ['flash point', 'autoignition temperature'],
  );
  return compounds.map((compound) => {
    // Preferred values come first.
    const of = (property: string) =>
      values.find((value) => value.compoundId === compound.id && value.property === property);
    const [flash, ignition] = [of('flash point'), of('autoignition temperature')];
    const sources = [...new Set([flash?.source, ignition?.source].filter((source) => source !== undefined))];
    return {
      name: compound.name,
      peroxideClass: compound.peroxideClass,
      flashPointC: flash?.value ?? null,
      autoignitionC: ignition?.value ?? null,
      ...(sources.length > 0 && { source: sources.join('; ') }),
    };
  });
}
