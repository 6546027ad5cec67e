import { z } from 'zod';
import { evidenceResponse } from '@/lib/evidence/schema';
import { refractiveReadingSchema } from '@/lib/evidence/refractive-index/schema';
import { fractionSchema } from '@/lib/distillation/fraction-schema';
import { fractionActions } from '@/lib/signoff/sign-off-rules';
import { signatureSchema } from '@/lib/signoff/schema';
import { criteriaSchema } from './criteria/registry';

const text = z.string().nullable();

export const criterionResultSchema = z.object({
  name: z.string(),
  state: z.enum(['pass', 'fail', 'inconclusive', 'blind', 'missing']),
  measured: text,
  limit: text,
  uncertainty: text.describe('expanded, k = 2'),
  reason: z.string(),
  source: z.string(),
});

export const coverageRowSchema = z.object({
  compound: z.string(),
  decides: z.boolean().describe('false: the row informs, and does not decide on the verdict'),
  seen: z.boolean(),
  tests: z.array(
    z.object({
      test: z.string(),
      state: z.enum(['sees', 'blind', 'not done']),
      limitPercent: z.number().optional().describe('in the unit that the reason names'),
      reason: z.string(),
      wouldSee: z.boolean().optional(),
    }),
  ),
  advice: text,
});

export const verdictSchema = z.object({
  state: z.enum(['pass', 'fail', 'inconclusive', 'blind', 'incomplete']),
  summary: z.string(),
  criteria: z.array(criterionResultSchema),
  engineVersion: z.string(),
  judgedAt: text,
  specification: z
    .object({
      id: z.string(),
      grade: z.string(),
      edition: z.number(),
      decisionRule: z.enum(['simple', 'guarded']),
      criteria: criteriaSchema,
    })
    .nullable(),
});

const spotSchema = z.object({
  photoId: z.string(),
  rf: z.number(),
  rfUncertainty: z.number(),
  flags: z.array(z.string()),
});

export const sheetPlateSchema = z.object({
  id: z.string(),
  stationaryPhase: z.string(),
  eluent: z.string(),
  photos: z.array(
    z.object({ id: z.string(), evidenceId: z.string(), visualiser: z.string(), flags: z.array(z.string()) }),
  ),
  lanes: z.array(z.object({ id: z.string(), label: z.string(), spots: z.array(spotSchema) })),
});

const sheetPeakSchema = z.object({
  number: z.number(),
  retentionTimeMin: z.number(),
  areaPercent: z.number(),
  signalToNoise: z.number().nullable(),
  flags: z.array(z.string()),
  compound: text,
});

export const sheetTraceSchema = z.object({
  id: z.string(),
  evidenceId: z.string(),
  subject: z.string(),
  detector: z.string(),
  durationMin: z.number(),
  integration: z
    .object({
      id: z.string(),
      number: z.number(),
      methodVersion: z.string(),
      reason: text,
      author: z.string(),
      createdAt: z.string(),
      flags: z.array(z.string()),
      peaks: z.array(sheetPeakSchema),
    })
    .nullable()
    .describe('the one in force'),
  integrations: z.number().int().describe('how many versions there are'),
});

export const sheetBoilingRangeSchema = z.object({
  state: z.enum(['pass', 'fail', 'inconclusive', 'missing']),
  reason: z.string(),
  toleranceC: z.number(),
  lowC: z.number().nullable(),
  highC: z.number().nullable(),
  pressureMbar: z.number().nullable(),
  expectedC: z.number().nullable(),
  uncertaintyC: z.number().nullable(),
  method: text,
  source: text,
  notes: z.array(z.string()),
});

export const transitionSchema = z.object({
  action: z.string(),
  from: z.string(),
  to: z.string(),
  reason: text,
  by: z.string(),
  at: z.string(),
});

/** The evidence sheet: everything that is known of one fraction. */
export const fractionSheetSchema = fractionSchema.omit({ verdict: true }).extend({
  group: z.object({ id: z.string(), name: z.string() }),
  verdict: verdictSchema,
  coverage: z.array(coverageRowSchema),
  evidence: z.array(evidenceResponse),
  plates: z.array(sheetPlateSchema),
  traces: z.array(sheetTraceSchema),
  refractiveReadings: z.array(refractiveReadingSchema),
  boilingRange: sheetBoilingRangeSchema,
  signatures: z.array(signatureSchema),
  transitions: z.array(transitionSchema),
  actions: z.record(z.enum(fractionActions), text).describe('null: possible now; otherwise why not'),
});

export type FractionSheet = z.output<typeof fractionSheetSchema>;
