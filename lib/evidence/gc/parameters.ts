import { z } from 'zod';

/** Changes whenever the same points and parameters could give another figure. */
export const integrationMethodVersion = 'heartcut-gc-1';

const minutes = z.number().min(0).max(100_000);

export const excludedRangeSchema = z
  .object({
    fromMin: minutes.describe('Start of the range left out of the sum, min'),
    toMin: minutes.describe('End of the range left out of the sum, min'),
    reason: z.string().trim().min(3).max(500).describe('Why, for example "solvent"'),
  })
  .strict()
  .refine((range) => range.toMin > range.fromMin, {
    message: 'The end of the range must be later than its start.',
    path: ['toMin'],
  });

/**
 * Parameters of an integration. All are stored with the result. Units are in the names; a field
 * that is left out takes its default, so `{}` is a full set.
 */
export const integrationParametersSchema = z
  .object({
    minimumSignalToNoise: z
      .number()
      .min(1)
      .max(100_000)
      .default(3)
      .describe(
        'Smallest S/N = 2H/h that is reported (3: detection limit, Ph. Eur. 2.2.46; 10: quantitation limit)',
      ),
    minimumAreaPercent: z
      .number()
      .min(0)
      .max(50)
      .default(0.01)
      .describe('Peaks under this area % are left out of the table and of the sum (disregard limit), %'),
    baseline: z
      .enum(['between-peaks', 'valley-to-valley', 'none'])
      .default('between-peaks')
      .describe(
        'between-peaks: straight lines between stretches without a peak; valley-to-valley: also through each valley; none: the signal has no offset',
      ),
    smoothing: z
      .object({
        method: z.literal('savitzky-golay'),
        windowPoints: z.number().int().min(5).max(101).describe('Odd number of points'),
        order: z
          .union([z.literal(2), z.literal(4)])
          .default(2)
          .describe('Order of the fitted polynomial'),
      })
      .strict()
      .refine((s) => s.windowPoints % 2 === 1, {
        message: 'Give an odd number of points.',
        path: ['windowPoints'],
      })
      .refine((s) => s.windowPoints > s.order + 1, { message: 'The window is too short for this order.' })
      .nullable()
      .default(null)
      .describe('Off (null) by default: smoothing broadens narrow peaks'),
    skimHeightRatio: z
      .number()
      .min(2)
      .max(10_000)
      .default(10)
      .describe(
        'A peak at least this many times lower than the one it rides on is skimmed off its tail (common practice)',
      ),
    reportShoulders: z
      .boolean()
      .default(true)
      .describe('Split off shoulders that have no valley of their own'),
    exclude: z
      .array(excludedRangeSchema)
      .max(50)
      .default([])
      .describe('Ranges that do not count, with the reason'),
  })
  .strict();

export type IntegrationParameters = z.output<typeof integrationParametersSchema>;
export type IntegrationParametersInput = z.input<typeof integrationParametersSchema>;

/** The parameters that are used when nobody chose any. */
export const defaultIntegrationParameters: IntegrationParameters = integrationParametersSchema.parse({});
