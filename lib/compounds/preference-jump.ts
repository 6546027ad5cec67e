/** More than sources of one value differ by (common practice), in the unit of the property. */
const PLAUSIBLE_SPREAD: Readonly<Record<string, { most: number; unit: string }>> = {
  'refractive index': { most: 0.002, unit: '' },
  'normal boiling point': { most: 2, unit: ' °C' },
  density: { most: 0.02, unit: ' g/mL' },
};

type Valued = { value?: number | null };

/**
 * What to say where a new preferred value lies farther from the old one than sources usually differ; null where
 * it does not, or where the property is not watched.
 */
export function preferenceJump(property: string, from: Valued, to: Valued): string | null {
  const spread = PLAUSIBLE_SPREAD[property];
  if (!spread || typeof from.value !== 'number' || typeof to.value !== 'number') return null;
  const difference = Math.abs(to.value - from.value);
  if (difference <= spread.most + 1e-9) return null;
  const size = Number(difference.toPrecision(4));
  return `This ${property} differs from the preferred one (${from.value}${spread.unit}) by ${size}${spread.unit}, more than ${spread.most}${spread.unit}: say why it is the better one.`;
}
