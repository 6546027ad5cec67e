import type { FormReader } from '@/components/runs/read-form';
import type { LiquidTexts } from './liquid-fields';

/** The liquid as the API takes it; what is wrong goes to the reader's problems. */
export function readLiquid(reader: FormReader, liquid: LiquidTexts): Record<string, unknown> {
  if (liquid.compound) return { compound: liquid.compound };
  const normalBoilingPointC = reader.temperatureC('normalBoilingPointC', liquid.normalBoilingPointC);
  reader.require(
    'compound',
    normalBoilingPointC !== null || Boolean(reader.problems.normalBoilingPointC),
    'Choose a compound, or give a normal boiling point.',
  );
  return { normalBoilingPointC, associated: liquid.associated };
}
