import { parseQuantity, type Parsed } from './quantity-text';
import { requireFinite } from './require-number';

export type MassUnit = 'g' | 'mg' | 'kg';

const GRAMS: Readonly<Record<MassUnit, number>> = { g: 1, mg: 0.001, kg: 1000 };
const SPELLINGS: Readonly<Record<string, MassUnit>> = { g: 'g', gram: 'g', grams: 'g', mg: 'mg', kg: 'kg' };

/** Converts a mass between units. Differences may be negative, so the sign is kept. */
export function convertMass(value: number, from: MassUnit, to: MassUnit): number {
  requireFinite(`Mass (${from})`, value);
  return from === to ? value : (value * GRAMS[from]) / GRAMS[to];
}

/** Reads "23,512", "250 mg" or "1.2 kg"; the value comes back in g. A negative mass is refused. */
export function parseMassG(text: string, fallback: MassUnit = 'g'): Parsed<'g'> {
  const parsed = parseQuantity(text, SPELLINGS, fallback, '23.51 g');
  if (!parsed.ok) return parsed;
  if (parsed.value < 0)
    return { ok: false, problem: 'A mass cannot be negative: check the balance was tared.' };
  return { ok: true, value: convertMass(parsed.value, parsed.unit, 'g'), unit: 'g' };
}

/** "23.51 g": two decimals of a gram unless told otherwise. */
export function formatMass(massG: number, unit: MassUnit = 'g', decimals = 2): string {
  const shown = convertMass(massG, 'g', unit).toFixed(decimals);
  const text = Number(shown) === 0 ? (0).toFixed(decimals) : shown;
  return `${text.replace('-', '\u2212')} ${unit}`;
}
