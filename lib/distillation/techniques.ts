/** The ways of distilling that a run may name: a closed list, so that runs can be compared. */
export const techniques = [
  'simple',
  'fractional',
  'short path',
  'reduced pressure',
  'bulb-to-bulb',
  'steam',
  'azeotropic',
] as const;
export type Technique = (typeof techniques)[number];

const withColdTrap: ReadonlySet<string> = new Set(['short path', 'reduced pressure', 'bulb-to-bulb']);

/** Whether a cold trap usually stands before the pump, so that its content belongs in the mass balance. */
export function hasColdTrap(technique: string): boolean {
  return withColdTrap.has(technique);
}
