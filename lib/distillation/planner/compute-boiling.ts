import { invalidField } from '@/lib/errors';
import {
  boilingPointAtPressure,
  type BoilingPointMethod,
  METHOD_NAMES,
} from '../boiling-point/boiling-point-at-pressure';
import { pressureForTemperature } from '../boiling-point/pressure-for-temperature';
import { presentCompoundRef } from '../present';
import { type PlannerLiquid, requireLiquid } from './find-liquid';
import type { BoilingPointBody, BoilingPointJson, BoilingPressureBody, BoilingPressureJson } from './schema';

/** Boiling point at a pressure, by the best method that the record allows; 422 names the field. */
export async function computeBoilingPoint(body: BoilingPointBody): Promise<BoilingPointJson> {
  const liquid = await requireLiquid(body);
  const found = boilingPointAtPressure(liquid.data, body.pressureMbar);
  return {
    boilingPointC: found.boilingPointC,
    pressureMbar: body.pressureMbar,
    ...basisOf(liquid, found),
  };
}

/** The pressure at which a liquid boils at a wanted temperature; 422 where glass stills do not reach. */
export async function computeBoilingPressure(body: BoilingPressureBody): Promise<BoilingPressureJson> {
  const liquid = await requireLiquid(body);
  const found = pressureForTemperature(liquid.data, body.temperatureC);
  if (!found.ok) throw invalidField('temperatureC', found.problem);
  const { pressureMbar, pressureLowMbar, pressureHighMbar } = found;
  return {
    pressureMbar,
    pressureLowMbar,
    pressureHighMbar,
    temperatureC: body.temperatureC,
    ...basisOf(liquid, found),
  };
}

type Found = { uncertaintyC: number; method: BoilingPointMethod; source: string; notes: string[] };

/** What stands beside a boiling point: liquid, uncertainty, method and source. */
export function basisOf({ compound, data }: PlannerLiquid, found: Found) {
  return {
    liquid: data.name,
    compound: compound ? presentCompoundRef(compound) : null,
    uncertaintyC: found.uncertaintyC,
    method: found.method,
    methodName: METHOD_NAMES[found.method],
    source: found.source,
    notes: found.notes,
  };
}
