import { requireFinite, requirePositive, requireWithin } from '@/lib/units/require-number';

/** Stands with each caution: a caution is never a permission, and none is no permission either. */
export const DEFERENCE = 'Follow local rules and the judgement of trained staff.';

export type Caution = {
  code:
    | 'peroxides'
    | 'polymerisation'
    | 'above-autoignition'
    | 'near-autoignition'
    | 'above-flash-point'
    | 'implosion'
    | 'closed-system'
    | 'dryness'
    | 'decomposition'
    | 'hazards-not-recorded';
  severity: 'caution' | 'warning';
  text: string;
  basis: string;
};

export type HazardousLiquid = {
  name: string;
  /** A: peroxides on storage; B: peroxides on concentration; C: peroxides start a polymerisation. */
  peroxideClass?: 'A' | 'B' | 'C' | null;
  flashPointC?: number | null;
  autoignitionC?: number | null;
  decompositionC?: number | null;
  /** Where the hazard values come from. */
  source?: string;
};

export type StillConditions = {
  liquids: readonly HazardousLiquid[];
  /** Temperature of the bath, mantle or hot plate: the hottest surface that vapour can meet. */
  heatingTemperatureC?: number | null;
  pressureMbar: number;
  /** Share of the charge that is planned to stay in the still, 0 to 1. */
  residueShare?: number | null;
};

/** Share of the autoignition temperature in °C that hot surfaces are kept under (EN 1127-1, from memory). */
const AUTOIGNITION_SHARE = 0.8;
/** Below this the glass carries a vacuum, mbar (common practice). */
const REDUCED_PRESSURE_MBAR = 900;
/** Less than this share left in the still is near dryness (common practice). */
const LEAST_RESIDUE_SHARE = 0.1;

/**
 * The usual cautions of a distillation, warnings first. Each ends with DEFERENCE. They are drawn from what is
 * recorded, so an empty or short list says nothing about safety: a liquid without recorded hazards gets a caution
 * of its own. Throws a RangeError for numbers that are none.
 */
export function listCautions(still: StillConditions): Caution[] {
  requirePositive('Pressure (mbar)', still.pressureMbar);
  const heating = still.heatingTemperatureC ?? null;
  if (heating !== null) requireFinite('Heating temperature (°C)', heating);
  const cautions = still.liquids.flatMap((liquid) => [
    ...peroxideCautions(liquid),
    ...fireCautions(liquid, heating),
    ...recordCautions(liquid),
  ]);
  cautions.push(...apparatusCautions(still));
  return [
    ...cautions.filter((c) => c.severity === 'warning'),
    ...cautions.filter((c) => c.severity === 'caution'),
  ];
}

function caution(code: Caution['code'], severity: Caution['severity'], text: string, basis: string): Caution {
  return { code, severity, text: `${text} ${DEFERENCE}`, basis };
}

function peroxideCautions(liquid: HazardousLiquid): Caution[] {
  const basis = 'published lists of peroxide formers, classes from memory; confirm against a current list';
  switch (liquid.peroxideClass) {
    case 'A':
      return [
        caution(
          'peroxides',
          'warning',
          `${liquid.name} forms explosive peroxides on storage, even without concentration: test for peroxides before distilling, do not distil when the test shows any, and never distil to dryness.`,
          basis,
        ),
      ];
    case 'B':
      return [
        caution(
          'peroxides',
          'warning',
          `${liquid.name} forms peroxides that distillation concentrates in the still: test for peroxides before distilling, and never distil to dryness.`,
          basis,
        ),
      ];
    case 'C':
      return [
        caution(
          'polymerisation',
          'warning',
          `${liquid.name} forms peroxides that can start a violent polymerisation, and distilling takes it off its inhibitor: test for peroxides, keep an inhibitor in still and receiver, and never distil to dryness.`,
          basis,
        ),
      ];
    default:
      return [];
  }
}

function fireCautions(liquid: HazardousLiquid, heating: number | null): Caution[] {
  if (heating === null) return [];
  const found: Caution[] = [];
  const source = liquid.source ?? 'recorded hazards';
  const { autoignitionC, flashPointC, decompositionC } = liquid;
  if (autoignitionC != null) {
    requireFinite('Autoignition temperature (°C)', autoignitionC);
    const pair = `The heating at ${heating.toFixed(0)} °C`;
    const of = `the autoignition temperature of ${liquid.name}, ${autoignitionC.toFixed(0)} °C`;
    if (heating >= autoignitionC) {
      found.push(
        caution(
          'above-autoignition',
          'warning',
          `${pair} is at or above ${of}: vapour can catch fire on the hot surface without a spark. Heat less, or lower the pressure.`,
          source,
        ),
      );
    } else if (heating >= AUTOIGNITION_SHARE * autoignitionC) {
      found.push(
        caution(
          'near-autoignition',
          'caution',
          `${pair} is over 80 % of ${of}.`,
          `${source}; margin of EN 1127-1, from memory`,
        ),
      );
    }
  }
  if (flashPointC != null && heating >= requireFinite('Flash point (°C)', flashPointC)) {
    found.push(
      caution(
        'above-flash-point',
        'caution',
        `The heating at ${heating.toFixed(0)} °C is above the flash point of ${liquid.name}, ${flashPointC.toFixed(0)} °C: its vapour can be lit. No flame, no spark, a working hood, and let the still cool before air is let in.`,
        source,
      ),
    );
  }
  if (decompositionC != null && heating >= requireFinite('Decomposition temperature (°C)', decompositionC)) {
    found.push(
      caution(
        'decomposition',
        'warning',
        `The heating at ${heating.toFixed(0)} °C is at or above ${decompositionC.toFixed(0)} °C, where ${liquid.name} decomposes: gas and heat may come at once. Lower the pressure instead.`,
        source,
      ),
    );
  }
  return found;
}

function recordCautions(liquid: HazardousLiquid): Caution[] {
  const missing = [
    liquid.flashPointC == null ? 'flash point' : null,
    liquid.autoignitionC == null ? 'autoignition temperature' : null,
  ].filter((name) => name !== null);
  if (missing.length === 0) return [];
  return [
    caution(
      'hazards-not-recorded',
      'caution',
      `No ${missing.join(' and no ')} is recorded for ${liquid.name}: look it up in a safety data sheet; nothing recorded does not mean no hazard.`,
      'the record of the compound',
    ),
  ];
}

function apparatusCautions(still: StillConditions): Caution[] {
  const found: Caution[] = [];
  if (still.pressureMbar < REDUCED_PRESSURE_MBAR) {
    found.push(
      caution(
        'implosion',
        'warning',
        'Under reduced pressure glass can implode: work behind a shield with eye protection, check for cracks and stars, and use no flat-bottomed glass that is not made for vacuum.',
        'common practice',
      ),
    );
  }
  found.push(
    caution(
      'closed-system',
      'warning',
      'Never heat a closed system: check that the path to the air or to the pump is open before heating, and that nothing can plug it.',
      'common practice',
    ),
  );
  const share = still.residueShare ?? null;
  if (share !== null) requireWithin('Share left in the still', share, 0, 1);
  const peroxides = still.liquids.some((l) => l.peroxideClass);
  const near = share !== null && share < LEAST_RESIDUE_SHARE;
  found.push(
    caution(
      'dryness',
      near || peroxides ? 'warning' : 'caution',
      near
        ? `Only ${(100 * share).toFixed(0)} % of the charge is to stay in the still: that is near dryness, where the flask overheats and peroxides concentrate. Leave at least a tenth.`
        : 'Stop before the still runs dry: leave at least a tenth of the charge in it.',
      'common practice',
    ),
  );
  return found;
}
