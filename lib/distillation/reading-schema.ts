import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';
import { bathTemperatureC, headTemperatureC, instant, pressureMbar, shortText, volumeMl } from './quantities';

/** One log reading as sent: a time and at least one value or a note. */
export const newReadingSchema = z
  .strictObject({
    at: instant,
    headTemperatureC: headTemperatureC.nullish(),
    bathTemperatureC: bathTemperatureC.nullish(),
    pressureMbar: pressureMbar.nullish(),
    volumeMl: volumeMl.nullish().describe('collected so far in this run'),
    note: shortText(500).nullish(),
  })
  .refine(
    ({ at: _, ...values }) => Object.values(values).some((value) => value !== undefined && value !== null),
    'A reading holds at least one value or a note.',
  );
export type NewReading = z.infer<typeof newReadingSchema>;

export const readingsPerCall = 10_000;

/** Body of POST /api/v1/runs/{code}/readings. */
export const newReadingsSchema = z.strictObject({
  readings: z
    .array(newReadingSchema)
    .min(1, 'Send at least one reading.')
    .max(readingsPerCall, 'Send at most 10,000 readings in a call.'),
});

export const readingsAddedSchema = z.object({
  run: z.string(),
  count: z.number(),
  firstAt: z.string(),
  lastAt: z.string(),
});

export const readingSchema = z.object({
  id: z.string(),
  at: z.string(),
  headTemperatureC: z.number().nullable(),
  bathTemperatureC: z.number().nullable(),
  pressureMbar: z.number().nullable(),
  volumeMl: z.number().nullable(),
  note: z.string().nullable(),
  sentBy: z.enum(['user', 'token']),
});
export type ReadingJson = z.infer<typeof readingSchema>;
export const readingPageSchema = z.object({
  items: z.array(readingSchema),
  nextCursor: z.string().nullable(),
});
export const readingListQuery = z.strictObject({ ...pageQuery });
export type ReadingListQuery = z.infer<typeof readingListQuery>;
