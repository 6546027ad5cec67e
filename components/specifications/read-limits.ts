/** What is typed into the form of a specification, as texts. */
export type LimitTexts = {
  gcAreaPercentMin: string;
  gcSingleImpurityMaxPercent: string;
  refractiveIndexTolerance: string;
  boilingToleranceC: string;
  boilingMaximumWidthC: string;
  waterMaxPercent: string;
  tlcCleanUnder: string[];
};

export const noLimits: LimitTexts = {
  gcAreaPercentMin: '',
  gcSingleImpurityMaxPercent: '',
  refractiveIndexTolerance: '',
  boilingToleranceC: '',
  boilingMaximumWidthC: '',
  waterMaxPercent: '',
  tlcCleanUnder: [],
};

/** A number as typed, with a decimal comma or point; undefined for nothing, NaN for what is no number. */
function readNumber(text: string): number | undefined {
  const trimmed = text.trim().replace(',', '.');
  return trimmed === '' ? undefined : Number(trimmed);
}

/** The limits as the API takes them. What is no number is named, by the field's name. */
export function readLimits(texts: LimitTexts): {
  criteria: Record<string, unknown>;
  errors: Record<string, string>;
} {
  const criteria: Record<string, unknown> = {};
  const errors: Record<string, string> = {};
  const numbers: Record<string, number | undefined> = {};
  for (const [name, text] of Object.entries(texts)) {
    if (typeof text !== 'string') continue;
    numbers[name] = readNumber(text);
    if (Number.isNaN(numbers[name])) errors[name] = 'Enter a number, such as 99.5.';
  }
  const { boilingToleranceC, boilingMaximumWidthC, ...plain } = numbers;
  for (const [name, value] of Object.entries(plain)) if (value !== undefined) criteria[name] = value;
  if (boilingToleranceC !== undefined) {
    criteria.boilingRange = {
      toleranceC: boilingToleranceC,
      ...(boilingMaximumWidthC === undefined ? {} : { maximumWidthC: boilingMaximumWidthC }),
    };
  } else if (boilingMaximumWidthC !== undefined) {
    errors.boilingToleranceC = 'Give the distance too: a width alone is not judged.';
  }
  if (texts.tlcCleanUnder.length > 0) criteria.tlcCleanUnder = texts.tlcCleanUnder;
  return { criteria, errors };
}
