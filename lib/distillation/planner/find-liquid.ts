import { listLiteratureInForce } from '@/lib/compounds/find-literature';
import { findVapourPressureData } from '@/lib/compounds/vapour-pressure-data';
import { inTransaction } from '@/lib/database/transaction';
import type { Compound } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';
import type { VapourPressureData } from '../boiling-point/vapour-pressure-data';
import type { HazardousLiquid } from '../cautions';
import { resolveCompound } from '../resolve-compounds';

/** The compound that a planner's field names, by id or CAS number; 422 for that field otherwise. */
export async function findPlannerCompound(reference: string, path: string): Promise<Compound> {
  return inTransaction((transaction) => resolveCompound(reference, path, transaction));
}

export type PlannerLiquid = { compound: Compound | null; data: VapourPressureData };

/** The vapour pressure data of a compound for the planner; 422 that names the field where none is kept. */
export async function requireCompoundLiquid(
  reference: string,
  path: string,
): Promise<{ compound: Compound; data: VapourPressureData }> {
  const compound = await findPlannerCompound(reference, path);
  const data = await findVapourPressureData(compound.id);
  if (data) return { compound, data };
  throw invalidField(
    path,
    `No normal boiling point is kept for ${compound.name}. Add one with its source to the compound first, or give a normal boiling point instead.`,
  );
}

/** A liquid by its record, or by nothing but a normal boiling point. */
export async function requireLiquid(given: {
  compound?: string;
  normalBoilingPointC?: number;
  associated?: boolean;
}): Promise<PlannerLiquid> {
  if (given.compound !== undefined) return requireCompoundLiquid(given.compound, 'compound');
  return {
    compound: null,
    data: {
      name: given.associated ? 'a liquid that associates' : 'a liquid that does not associate',
      normalBoilingPointC: given.normalBoilingPointC!,
      normalBoilingPointSource: 'entered by you',
      associated: given.associated ?? false,
    },
  };
}

/** What the record says of a compound's hazards, for the cautions. */
export async function hazardsOf(compound: Compound): Promise<HazardousLiquid> {
  const rows = await listLiteratureInForce([compound.id], ['flash point', 'autoignition temperature']);
  const flash = rows.find((row) => row.property === 'flash point');
  const ignition = rows.find((row) => row.property === 'autoignition temperature');
  const sources = [...new Set([flash?.source, ignition?.source].filter((source) => source !== undefined))];
  return {
    name: compound.name,
    peroxideClass: compound.peroxideClass,
    flashPointC: flash?.value ?? null,
    autoignitionC: ignition?.value ?? null,
    ...(sources.length > 0 && { source: sources.join('; ') }),
  };
}
