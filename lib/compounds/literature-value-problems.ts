import { propertyDefinition, type Condition, type LiteratureProperty } from './property-names';

export interface LiteratureValueDraft extends Readonly<Partial<Record<Condition, number | null>>> {
  property: LiteratureProperty;
  value?: number | null;
  coefficients?: Readonly<Record<string, number>> | null;
}

const CONDITION_WORDS: Readonly<Record<Condition, string>> = {
  temperatureC: 'temperature in °C',
  pressureKPa: 'pressure in kPa',
  wavelengthNm: 'wavelength in nm',
  rangeMinC: 'lower end of the temperature range in °C',
  rangeMaxC: 'upper end of the temperature range in °C',
};

/**
 * What is wrong with a literature value before it is stored: number or coefficients missing, a needed condition
 * missing, a number out of the plausible range. Empty where nothing is. Each message says what to do.
 */
export function literatureValueProblems(draft: LiteratureValueDraft): string[] {
  const definition = propertyDefinition(draft.property);
  const problems = definition.coefficients
    ? coefficientProblems(draft, definition.coefficients)
    : valueProblems(draft, definition.plausible, definition.unit);
  for (const condition of definition.requires)
    if (!Number.isFinite(draft[condition] ?? Number.NaN))
      problems.push(
        `Enter the ${CONDITION_WORDS[condition]}: without it the ${draft.property} cannot be compared.`,
      );
  const { rangeMinC: from, rangeMaxC: to } = draft;
  if (typeof from === 'number' && typeof to === 'number' && from >= to)
    problems.push('The lower end of the temperature range must lie below the upper end.');
  return problems;
}

function valueProblems(
  { property, value }: LiteratureValueDraft,
  { min, max }: { min: number; max: number },
  unit: string,
): string[] {
  if (typeof value !== 'number' || !Number.isFinite(value))
    return [`Enter the ${property} as a number in ${unit}.`];
  if (value >= min && value <= max) return [];
  return [
    `A ${property} of ${value} ${unit} is not plausible (${min} to ${max}): check the number and its unit.`,
  ];
}

function coefficientProblems({ coefficients }: LiteratureValueDraft, names: readonly string[]): string[] {
  const missing = names.filter((name) => !Number.isFinite(coefficients?.[name] ?? Number.NaN));
  const unknown = Object.keys(coefficients ?? {}).filter((name) => !names.includes(name));
  return [
    ...missing.map((name) => `Enter the coefficient ${name} as a number.`),
    ...unknown.map((name) => `Remove the coefficient ${name}: this equation has none of that name.`),
  ];
}
