/** How a compound forms peroxides, in the three classes of the published lists. */
export const PEROXIDE_CLASSES = ['A', 'B', 'C'] as const;
export type PeroxideClass = (typeof PEROXIDE_CLASSES)[number];

export interface PeroxideAdvice {
  peroxideClass: PeroxideClass;
  /** A few words for a label. */
  word: string;
  /** What to do before and during distillation. */
  advice: string;
  source: string;
}

const SOURCE =
  'Classes: R. J. Kelly, Chemical Health & Safety 1996, 3 (5), 28-36; National Research Council, Prudent Practices ' +
  'in the Laboratory (2011), section 4.D.3 (both from memory: confirm against a current list)';

const LOCAL_RULES = 'Follow local rules and the judgement of trained staff.';

const WORDS: Readonly<Record<PeroxideClass, { word: string; advice: string }>> = {
  A: {
    word: 'forms peroxides on storage',
    advice:
      'Peroxides can reach a dangerous level in the closed bottle, without any concentration. Note the date of opening, ' +
      'test before each use and do not distil a liquid that tests positive or is past its date. Do not move or open ' +
      `a container in which crystals are seen. ${LOCAL_RULES}`,
  },
  B: {
    word: 'forms peroxides; dangerous when concentrated',
    advice:
      'Distillation concentrates the peroxides in the flask. Test before distilling, remove peroxides first if the test ' +
      `is positive, and never distil to dryness: leave a good part of the charge in the flask. ${LOCAL_RULES}`,
  },
  C: {
    word: 'may polymerise, started by peroxides',
    advice:
      'Peroxides can start a violent polymerisation. Keep the inhibitor in until just before distilling, add an ' +
      'inhibitor that stays in the flask, keep the bath as cool as the pressure allows, and store the distillate cold ' +
      `with inhibitor. ${LOCAL_RULES}`,
  },
};

/** True for one of the letters A, B, C. */
export function isPeroxideClass(text: string): text is PeroxideClass {
  return (PEROXIDE_CLASSES as readonly string[]).includes(text);
}

/** The words and the advice that go with a peroxide class. A caution is never a permission. */
export function peroxideAdvice(peroxideClass: PeroxideClass): PeroxideAdvice {
  return { peroxideClass, ...WORDS[peroxideClass], source: SOURCE };
}
