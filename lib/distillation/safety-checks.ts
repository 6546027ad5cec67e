/**
 * What is looked at before heating, in the words that a person ticks. Common practice: a ticked list is
 * a record of what was looked at, never a permission.
 */
export const safetyChecks = {
  peroxidesTested: 'Tested for peroxides, or the charge forms none',
  glassInspected: 'Glass looked over: no star, crack or flat bottom under vacuum',
  shieldInPlace: 'Shield or sash in place',
  pathOpen: 'Path to the air or to the pump is open',
  coldTrapFilled: 'Cold trap filled, or none is needed',
  bumpingPrevented: 'Stirrer or boiling aid against bumping is in',
  coolingRuns: 'Condenser cooling runs',
  residueKept: 'It is agreed how much stays in the still',
} as const;

export type SafetyCheck = keyof typeof safetyChecks;
export const safetyCheckNames = Object.keys(safetyChecks) as [SafetyCheck, ...SafetyCheck[]];
