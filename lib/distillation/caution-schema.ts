import { z } from 'zod';

/** The still as planned: compounds by id with commas between, heating and pressure where known. */
export const cautionQuery = z.strictObject({
  compounds: z
    .string()
    .transform((text) => text.split(',').filter(Boolean))
    .pipe(z.array(z.uuid()).max(60))
    .describe('ids with commas between'),
  heatingTemperatureC: z.coerce.number().min(-100).max(600).optional(),
  pressureMbar: z.coerce.number().positive().max(1999).optional(),
});

export const cautionsSchema = z.object({
  cautions: z.array(
    z.object({
      code: z.string(),
      severity: z.enum(['caution', 'warning']),
      text: z.string(),
      basis: z.string(),
    }),
  ),
});
export type CautionsJson = z.infer<typeof cautionsSchema>;
