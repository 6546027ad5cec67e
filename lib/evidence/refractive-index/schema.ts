import { z } from 'zod';
import { compoundRefSchema, shortText } from '@/lib/distillation/quantities';
import { pageQuery } from '@/lib/http/paging';

const index = z
  .number()
  .min(1.2, 'A refractive index of a liquid lies between 1.2 and 1.9: check the reading.')
  .max(1.9, 'A refractive index of a liquid lies between 1.2 and 1.9: check the reading.');

/** Body of POST /api/v1/fractions/{code}/refractive-readings. */
export const newRefractiveReadingSchema = z
  .strictObject({
    readings: z
      .array(index)
      .min(1, 'Enter at least one reading.')
      .max(50, 'Enter at most 50 readings of one sample.'),
    temperatureC: z
      .number()
      .min(-20, 'The temperature of the prism lies between -20 and 100 °C: check sign and unit.')
      .max(100, 'The temperature of the prism lies between -20 and 100 °C: check sign and unit.')
      .describe('of the prism when the sample was read'),
    wavelengthNm: z
      .number()
      .min(200, 'Give the wavelength in nm, for example 589.3 for the sodium D line.')
      .max(2000, 'Give the wavelength in nm, for example 589.3 for the sodium D line.')
      .default(589.3)
      .describe('only the sodium D line, 589.3 nm, can be compared'),
    waterReading: index.nullish().describe('pure water on the same instrument'),
    waterTemperatureC: z
      .number()
      .min(15, 'Check the instrument with water between 15 and 30 °C.')
      .max(30, 'Check the instrument with water between 15 and 30 °C.')
      .nullish()
      .describe('left out: the temperature of the sample'),
    instrument: shortText(160).nullish().describe('name or number of the refractometer'),
    resolution: z
      .number()
      .gt(0)
      .max(0.01, 'The smallest step of a refractometer is 0.01 or less.')
      .optional()
      .describe('smallest step that the instrument shows; 0.0001 when left out'),
    temperatureUncertaintyC: z
      .number()
      .min(0)
      .max(5, 'A temperature known only to 5 °C says nothing.')
      .optional()
      .describe('standard uncertainty of the temperature; 0.1 °C when left out'),
  })
  .refine((given) => given.waterTemperatureC == null || given.waterReading != null, {
    path: ['waterReading'],
    error: 'Enter what the water read, or leave its temperature out.',
  })
  .refine(
    (given) =>
      given.waterReading == null ||
      given.waterTemperatureC != null ||
      (given.temperatureC >= 15 && given.temperatureC <= 30),
    { path: ['waterTemperatureC'], error: 'Enter the temperature of the water, between 15 and 30 °C.' },
  );
export type NewRefractiveReading = z.infer<typeof newRefractiveReadingSchema>;

const visibleSchema = z.object({
  compound: compoundRefSchema,
  state: z.enum(['sees', 'blind', 'unknown']),
  volumePercent: z.number().nullable(),
  reason: z.string(),
});

const budgetRowSchema = z.object({
  source: z.string(),
  type: z.enum(['A', 'B']),
  distribution: z.enum(['normal', 'rectangular']),
  standardUncertainty: z.number(),
  basis: z.string(),
});

/** What the server made of the readings: stored as it is, and never computed again. */
export const refractiveResultSchema = z.object({
  meanN: z.number(),
  standardDeviation: z.number().nullable(),
  correctedN: z.number().nullable().describe('null: no literature temperature to correct to'),
  atTemperatureC: z.number().nullable(),
  literature: z
    .object({ n: z.number(), temperatureC: z.number(), source: z.string(), valueId: z.string() })
    .nullable(),
  difference: z.number().nullable().describe('corrected mean minus literature'),
  expandedUncertainty: z.number().nullable().describe('U of the difference, k = 2'),
  coverageFactor: z.literal(2),
  fallPerC: z.number(),
  fallSource: z.string(),
  tolerance: z.number(),
  decisionRule: z.enum(['simple', 'guarded']),
  toleranceSource: z.string().describe('the specification, or that there is none'),
  reason: z.string(),
  waterCheck: z
    .object({
      state: z.enum(['good', 'warning', 'inconclusive']),
      expected: z.number(),
      offset: z.number(),
      reason: z.string(),
    })
    .nullable(),
  budget: z.array(budgetRowSchema),
  notes: z.array(z.string()),
  smallestVisible: z.array(visibleSchema),
});
export type RefractiveResult = z.infer<typeof refractiveResultSchema>;

export const refractiveReadingSchema = refractiveResultSchema.extend({
  id: z.string(),
  fraction: z.string(),
  readings: z.array(z.number()),
  temperatureC: z.number(),
  wavelengthNm: z.number(),
  waterReading: z.number().nullable(),
  waterTemperatureC: z.number().nullable(),
  instrument: z.string().nullable(),
  state: z.enum(['pass', 'fail', 'inconclusive']),
  methodVersion: z.string(),
  readBy: z.string(),
  createdAt: z.string(),
});
export type RefractiveReadingJson = z.infer<typeof refractiveReadingSchema>;

export const refractiveReadingListQuery = z.strictObject({ ...pageQuery });
export type RefractiveReadingListQuery = z.infer<typeof refractiveReadingListQuery>;
export const refractiveReadingPageSchema = z.object({
  items: z.array(refractiveReadingSchema),
  nextCursor: z.string().nullable(),
});
