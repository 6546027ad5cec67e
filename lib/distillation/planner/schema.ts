import { z } from 'zod';
import { compoundRefSchema, shortText } from '../quantities';

const reference = shortText(200).describe('id or CAS number of a compound');
const pressure = z
  .number()
  .min(0.02, 'Heartcut plans from 0.02 to 1999 mbar absolute: check the unit.')
  .max(1999, 'Heartcut plans from 0.02 to 1999 mbar absolute: check the unit.');
const temperature = z
  .number()
  .min(-100, 'Give a temperature between -100 and 500 °C: check sign and unit.')
  .max(500, 'Give a temperature between -100 and 500 °C: check sign and unit.');

/** A recorded compound, or a liquid of which only the normal boiling point is known. */
const liquid = {
  compound: reference.optional(),
  normalBoilingPointC: z
    .number()
    .min(-100, 'A normal boiling point lies between -100 and 600 °C.')
    .max(600, 'A normal boiling point lies between -100 and 600 °C.')
    .optional()
    .describe('at 101.325 kPa, for a liquid that is not recorded'),
  associated: z
    .boolean()
    .optional()
    .describe('alcohols, acids, water and others that hold together by hydrogen bonds'),
};

type Liquid = { compound?: string; normalBoilingPointC?: number; associated?: boolean };
const oneLiquid = (given: Liquid) =>
  (given.compound === undefined) !== (given.normalBoilingPointC === undefined);
const oneLiquidProblem = {
  path: ['compound'],
  error: 'Name a compound by id or CAS number, or give the normal boiling point of a liquid: one of the two.',
};

export const boilingPointBody = z
  .strictObject({ ...liquid, pressureMbar: pressure.describe('absolute') })
  .refine(oneLiquid, oneLiquidProblem);
export type BoilingPointBody = z.infer<typeof boilingPointBody>;

export const boilingPressureBody = z
  .strictObject({ ...liquid, temperatureC: temperature.describe('at which it shall boil') })
  .refine(oneLiquid, oneLiquidProblem);
export type BoilingPressureBody = z.infer<typeof boilingPressureBody>;

/** What every answer about a boiling point says beside the number. */
const basis = {
  liquid: z.string().describe('what the answer is about'),
  compound: compoundRefSchema.nullable(),
  uncertaintyC: z.number().describe('half-width of the boiling point, about 95 %'),
  method: z.enum(['wagner', 'antoine', 'maxwell-bonnell']),
  methodName: z.string(),
  source: z.string(),
  notes: z.array(z.string()),
};

export const boilingPointSchema = z.object({
  boilingPointC: z.number(),
  pressureMbar: z.number(),
  ...basis,
});
export type BoilingPointJson = z.infer<typeof boilingPointSchema>;

export const boilingPressureSchema = z.object({
  pressureMbar: z.number(),
  pressureLowMbar: z.number(),
  pressureHighMbar: z.number(),
  temperatureC: z.number(),
  ...basis,
});
export type BoilingPressureJson = z.infer<typeof boilingPressureSchema>;

const index = z
  .number()
  .min(1.2, 'A refractive index of a liquid lies between 1.2 and 1.9: check the reading.')
  .max(1.9, 'A refractive index of a liquid lies between 1.2 and 1.9: check the reading.');

export const refractiveIndexBody = z.strictObject({
  compound: reference,
  n: index,
  temperatureC: z
    .number()
    .min(-20, 'The temperature of the prism lies between -20 and 100 °C.')
    .max(100, 'The temperature of the prism lies between -20 and 100 °C.'),
});
export type RefractiveIndexBody = z.infer<typeof refractiveIndexBody>;

export const refractiveIndexSchema = z.object({
  correctedN: z.number(),
  atTemperatureC: z.number(),
  difference: z.number(),
  expandedUncertainty: z.number(),
  compound: compoundRefSchema,
  literature: z.object({ n: z.number(), temperatureC: z.number(), source: z.string() }),
  fallPerC: z.number(),
  fallSource: z.string(),
  method: z.string(),
  notes: z.array(z.string()),
});

const purity = z
  .number()
  .min(0.5, 'Give the purity as a mole fraction between 0.5 and 1, for example 0.95.')
  .lt(1, 'Give the purity as a mole fraction below 1, for example 0.95: nothing is ever all of it.');

export const separationBody = z
  .strictObject({
    light: reference.describe('the one that boils lower: id or CAS number'),
    heavy: reference,
    pressureMbar: pressure.describe('absolute'),
    lightPurity: purity.optional().describe('mole fraction of the light one wanted in the distillate; 0.95'),
    heavyPurity: purity.optional().describe('mole fraction of the heavy one wanted in the still; 0.95'),
    bathTemperatureC: z.number().min(-100).max(600).optional().describe('for the cautions'),
  })
  .refine((given) => given.light !== given.heavy, {
    path: ['heavy'],
    error: 'Light and heavy are the same compound: choose two.',
  });
export type SeparationBody = z.infer<typeof separationBody>;

const boilingSchema = boilingPointSchema.omit({ pressureMbar: true });
export const separationSchema = z.object({
  lightBoilingPointC: z.number(),
  heavyBoilingPointC: z.number(),
  differenceC: z.number(),
  meanTemperatureC: z.number(),
  relativeVolatility: z.number(),
  minimumStages: z.number().describe('theoretical stages at total reflux (Fenske), the still counts as one'),
  technique: z.string(),
  advice: z.string(),
  adviceBasis: z.string(),
  light: boilingSchema,
  heavy: boilingSchema,
  azeotropes: z.array(
    z.object({
      lightMassPercent: z.number(),
      heavyMassPercent: z.number(),
      boilingPointC: z.number(),
      pressureKPa: z.number(),
      kind: z.enum(['minimum', 'maximum']),
      twoLayers: z.boolean(),
      source: z.string(),
    }),
  ),
  cautions: z.array(
    z.object({
      code: z.string(),
      severity: z.enum(['caution', 'warning']),
      text: z.string(),
      basis: z.string(),
    }),
  ),
  notes: z.array(z.string()),
});
export type SeparationJson = z.infer<typeof separationSchema>;
