import { z } from 'zod';
import { compoundRefSchema, shortText } from '@/lib/distillation/quantities';
import { pageQuery } from '@/lib/http/paging';
import { integrationParametersSchema } from './parameters';

export const traceSubjects = ['fraction', 'crude', 'blank', 'reference'] as const;
export type TraceSubject = (typeof traceSubjects)[number];

const timeUnits = { s: 's', seconds: 's', min: 'min', minutes: 'min', ms: 'ms', h: 'h' } as const;
const delimiters = {
  ',': ',',
  comma: ',',
  ';': ';',
  semicolon: ';',
  tab: 'tab',
  '\t': 'tab',
  space: 'space',
  ' ': 'space',
  '|': '|',
} as const;
const decimals = { '.': '.', point: '.', ',': ',', comma: ',' } as const;

/** A value of a closed list that may be written in more than one way. */
function spelt<T extends Record<string, string>>(spellings: T) {
  const written = Object.keys(spellings) as [keyof T & string, ...(keyof T & string)[]];
  return z.enum(written).transform((text) => spellings[text] as T[keyof T]);
}

const column = z
  .union([z.number().int().min(0).max(999), shortText(200)])
  .describe('number from 0, or name in the heading');

/** How a table is to be read; what is left out is detected. */
export const readOptionsSchema = z.strictObject({
  timeUnit: spelt(timeUnits).optional(),
  timeColumn: column.optional(),
  signalColumn: column.optional(),
  delimiter: spelt(delimiters).optional(),
  decimal: spelt(decimals).optional().describe('decimal sign'),
  samplingHz: z
    .number()
    .gt(0, 'A sampling rate is above zero.')
    .max(100_000)
    .optional()
    .describe('points per second, for a table without times'),
});

/** The same as it is kept and answered, in one spelling. */
export const keptReadSchema = z.object({
  timeUnit: z.enum(['s', 'min', 'ms', 'h']).optional(),
  timeColumn: z.union([z.number(), z.string()]).optional(),
  signalColumn: z.union([z.number(), z.string()]).optional(),
  delimiter: z.enum([',', ';', 'tab', 'space', '|']).optional(),
  decimal: z.enum(['.', ',']).optional(),
  samplingHz: z.number().optional(),
});
export type ReadOptions = z.infer<typeof keptReadSchema>;

export const detectorSchema = z
  .string()
  .trim()
  .min(1)
  .max(20, 'A detector is named in 20 signs or less, for example FID, TCD or MS.');

/** Body of POST /api/v1/traces. */
export const newTraceSchema = z.strictObject({
  evidenceId: z.uuid(),
  fraction: shortText(60).optional().describe('code; left out: the fraction of the file'),
  run: shortText(60).optional().describe('code; for the crude, a blank or a reference of the whole run'),
  subject: z.enum(traceSubjects),
  detector: detectorSchema.optional().describe('FID, TCD, MS ...; FID is assumed, and said so'),
  read: readOptionsSchema.optional(),
});
export type NewTrace = z.output<typeof newTraceSchema>;

/** Body of POST /api/v1/evidence/{id}/trace-preview. */
export const tracePreviewBody = z.strictObject({ read: readOptionsSchema.optional() });

export const detectedSchema = z.object({
  delimiter: z.string(),
  decimal: z.string(),
  encoding: z.string(),
  headerLines: z.number(),
  timeColumn: z.number().nullable(),
  signalColumn: z.number(),
  timeUnit: z.string(),
  timeUnitFrom: z.enum(['given', 'heading', 'assumed', 'sampling']),
  columns: z.array(z.string()),
});
export type Detected = z.infer<typeof detectedSchema>;

export const tracePreviewSchema = z.object({
  detected: detectedSchema,
  detector: z.string().nullable().describe('as the file name or heading names it'),
  pointCount: z.number(),
  startMin: z.number(),
  durationMin: z.number(),
  peakCount: z.number(),
  timeMin: z.array(z.number()),
  signal: z.array(z.number()),
});
export type TracePreviewJson = z.infer<typeof tracePreviewSchema>;

export const peakSchema = z.object({
  number: z.number(),
  retentionTimeMin: z.number(),
  startMin: z.number(),
  endMin: z.number(),
  area: z.number(),
  areaPercent: z.number(),
  height: z.number(),
  widthHalfMin: z.number().nullable(),
  tailing: z.number().nullable(),
  plates: z.number().nullable(),
  resolution: z.number().nullable(),
  signalToNoise: z.number().nullable(),
  flags: z.array(z.string()),
  compound: compoundRefSchema.nullable(),
});
export type PeakJson = z.infer<typeof peakSchema>;

/** What an integration found beside its peaks; kept with the baseline. */
export const integrationDetailSchema = z.object({
  timeMin: z.array(z.number()),
  signal: z.array(z.number()),
  totalArea: z.number(),
  disregardedPeakCount: z.number(),
  excludedPeaks: z.array(
    z.object({ retentionTimeMin: z.number(), area: z.number(), height: z.number(), reason: z.string() }),
  ),
  negativeDips: z.array(
    z.object({
      startMin: z.number(),
      endMin: z.number(),
      lowestMin: z.number(),
      depth: z.number(),
      area: z.number(),
    }),
  ),
  noiseMethod: z.string(),
  read: keptReadSchema,
});
export type IntegrationDetail = z.infer<typeof integrationDetailSchema>;

export const integrationSchema = z.object({
  id: z.string(),
  traceId: z.string(),
  version: z.number().describe('counts the integrations of a trace from 1'),
  inForce: z.boolean(),
  methodVersion: z.string(),
  parameters: integrationParametersSchema,
  reason: z.string().nullable(),
  author: z.string(),
  createdAt: z.string(),
  peaks: z.array(peakSchema),
  flags: z.array(z.string()),
  noise: z.number().describe('peak to peak, in the unit of the signal: h of S/N = 2H/h'),
  noiseMethod: z.string(),
  totalArea: z.number(),
  baseline: z.object({ timeMin: z.array(z.number()), signal: z.array(z.number()) }),
  excludedPeaks: integrationDetailSchema.shape.excludedPeaks,
  negativeDips: integrationDetailSchema.shape.negativeDips,
  disregardedPeakCount: z.number(),
  read: keptReadSchema.describe('how the file was read for this version'),
});
export type IntegrationJson = z.infer<typeof integrationSchema>;

export const traceRowSchema = z.object({
  id: z.string(),
  version: z.number(),
  run: z.string(),
  fraction: z.string().nullable(),
  subject: z.enum(traceSubjects),
  detector: z.string(),
  detectorAssumed: z.boolean(),
  confirmed: z.boolean().describe('false: read on arrival, nobody has looked at how'),
  evidence: z.object({ id: z.string(), fileName: z.string(), sha256: z.string() }),
  pointCount: z.number(),
  startMin: z.number(),
  durationMin: z.number(),
  integrationId: z.string().nullable(),
  createdAt: z.string(),
});
export type TraceRow = z.infer<typeof traceRowSchema>;

export const traceSchema = traceRowSchema.extend({
  read: keptReadSchema,
  detected: detectedSchema,
  integration: integrationSchema,
});
export type TraceJson = z.infer<typeof traceSchema>;

export const traceParams = z.object({ id: z.uuid() });
export const traceListQuery = z.strictObject({
  ...pageQuery,
  fraction: z.string().trim().min(1).max(60).optional().describe('code'),
  run: z.string().trim().min(1).max(60).optional().describe('code'),
});
export type TraceListQuery = z.infer<typeof traceListQuery>;
export const tracePageSchema = z.object({
  items: z.array(traceRowSchema),
  nextCursor: z.string().nullable(),
});

export const pointsQuery = z
  .strictObject({
    from: z.coerce.number().optional().describe('min'),
    to: z.coerce.number().optional().describe('min'),
    pixels: z.coerce.number().int().min(10).max(10_000).default(1200).describe('width of the picture'),
  })
  .refine(({ from, to }) => from === undefined || to === undefined || to > from, {
    path: ['to'],
    error: 'The end of the range must be later than its start.',
  });
export type PointsQuery = z.output<typeof pointsQuery>;
export const pointsSchema = z.object({
  timeMin: z.array(z.number()),
  signal: z.array(z.number()),
  pointCount: z.number().describe('points of the whole trace'),
  thinned: z.boolean().describe('true: of each pixel only the lowest and the highest point'),
});
export type PointsJson = z.infer<typeof pointsSchema>;

/** Body of POST /api/v1/traces/{id}/integrations. */
export const newIntegrationSchema = z.strictObject({
  reason: z
    .string({ error: 'Say why the integration is changed: it stays with the new version.' })
    .trim()
    .min(3, 'Say why the integration is changed: it stays with the new version.')
    .max(1000),
  parameters: integrationParametersSchema.optional().describe('left out: those in force'),
  assign: z
    .array(
      z.strictObject({
        peak: z.number().int().min(1).describe('number in the new version'),
        compound: shortText(200).nullable().describe('id or CAS number; null takes the assignment away'),
      }),
    )
    .max(500)
    .optional(),
  edits: z.array(z.unknown()).max(0, 'Edits by hand come later. Change the parameters instead.').optional(),
});
export type NewIntegration = z.output<typeof newIntegrationSchema>;

export const integrationListQuery = z.strictObject({ ...pageQuery });
export type IntegrationListQuery = z.infer<typeof integrationListQuery>;
export const integrationRowSchema = z.object({
  id: z.string(),
  version: z.number(),
  inForce: z.boolean(),
  reason: z.string().nullable(),
  author: z.string(),
  createdAt: z.string(),
  peakCount: z.number(),
});
export type IntegrationRow = z.infer<typeof integrationRowSchema>;
export const integrationPageSchema = z.object({
  items: z.array(integrationRowSchema),
  nextCursor: z.string().nullable(),
});
