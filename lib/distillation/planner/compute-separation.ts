import type { Compound } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';
import { type Azeotrope, findAzeotropes } from '../azeotropes';
import { DEFERENCE, listCautions } from '../cautions';
import { planSeparation } from '../separation';
import { basisOf } from './compute-boiling';
import { hazardsOf, requireCompoundLiquid } from './find-liquid';
import type { SeparationBody, SeparationJson } from './schema';

/** How well two liquids part at a pressure, with known azeotropes and the usual cautions; nothing is saved. */
export async function computeSeparation(body: SeparationBody): Promise<SeparationJson> {
  const light = await requireCompoundLiquid(body.light, 'light');
  const heavy = await requireCompoundLiquid(body.heavy, 'heavy');
  if (light.compound.id === heavy.compound.id)
    throw invalidField('heavy', 'Light and heavy are the same compound: choose two.');
  const plan = planSeparation({
    light: light.data,
    heavy: heavy.data,
    pressureMbar: body.pressureMbar,
    lightPurity: body.lightPurity,
    heavyPurity: body.heavyPurity,
  });
  if (!plan.ok) throw invalidField('light', plan.problem);
  const azeotropes = azeotropesOf(light.compound, heavy.compound);
  const cautions = listCautions({
    liquids: await Promise.all([hazardsOf(light.compound), hazardsOf(heavy.compound)]),
    pressureMbar: body.pressureMbar,
    heatingTemperatureC: body.bathTemperatureC ?? null,
  });
  return {
    lightBoilingPointC: plan.light.boilingPointC,
    heavyBoilingPointC: plan.heavy.boilingPointC,
    differenceC: plan.differenceC,
    meanTemperatureC: plan.meanTemperatureC,
    relativeVolatility: plan.relativeVolatility,
    minimumStages: plan.minimumStages,
    technique: plan.advice.technique,
    advice: plan.advice.text,
    adviceBasis: plan.advice.basis,
    light: { boilingPointC: plan.light.boilingPointC, ...basisOf(light, plan.light) },
    heavy: { boilingPointC: plan.heavy.boilingPointC, ...basisOf(heavy, plan.heavy) },
    azeotropes: azeotropes.map((known) => ({
      lightMassPercent: known.massPercentA,
      heavyMassPercent: known.massPercentB,
      boilingPointC: known.boilingPointC,
      pressureKPa: known.pressureKPa,
      kind: known.kind,
      twoLayers: known.twoLayers,
      source: known.source,
    })),
    cautions: [
      ...azeotropes.map((known) => azeotropeCaution(known, light.compound.name, heavy.compound.name)),
      ...cautions,
    ],
    notes: plan.notes,
  };
}

function azeotropesOf(light: Compound, heavy: Compound): Azeotrope[] {
  if (!light.casNumber || !heavy.casNumber) return [];
  return findAzeotropes(light.casNumber, heavy.casNumber);
}

function azeotropeCaution(
  known: Azeotrope,
  light: string,
  heavy: string,
): SeparationJson['cautions'][number] {
  const layers = known.twoLayers
    ? ' The condensate parts into two layers: a separator can break it.'
    : ' Distillation at this pressure does not get past it: break it another way, for example by drying, washing or another pressure.';
  return {
    code: 'azeotrope',
    severity: 'warning',
    text: `${light} and ${heavy} form a ${known.kind}-boiling azeotrope: ${known.massPercentA} % ${light} and ${known.massPercentB} % ${heavy} by mass, ${known.boilingPointC} °C at ${known.pressureKPa} kPa; the composition shifts with pressure.${layers} ${DEFERENCE}`,
    basis: known.source,
  };
}
