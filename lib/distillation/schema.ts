import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';
import {
  bathTemperatureC,
  compoundRefSchema,
  instant,
  massG,
  nameRefSchema,
  pressureMbar,
  shortText,
} from './quantities';
import { safetyCheckNames } from './safety-checks';
import { techniques } from './techniques';

const compoundReference = shortText(200).describe('id or CAS number of a compound');
const charge = massG.gt(0, 'The charge is above zero.');

const changeable = {
  technique: z.enum(techniques),
  chargeMassG: charge,
  chargeSource: shortText(300).describe('where the charge comes from'),
  chargeLot: shortText(120).nullish(),
  columnStages: z.number().min(0).max(500).nullish().describe('theoretical stages of the column'),
  bath: shortText(120).nullish().describe('oil, sand, mantle, water ...'),
  bathTemperatureC: bathTemperatureC.nullish(),
  plannedPressureMbar: pressureMbar.nullish().describe('absolute'),
  safetyChecks: z.partialRecord(z.enum(safetyCheckNames), z.boolean()).optional(),
  residueMassG: massG.nullish(),
  note: z.string().trim().max(5000).nullish(),
  startedAt: instant.optional(),
  endedAt: instant.nullish(),
};

/** Body of POST /api/v1/runs. */
export const newRunSchema = z.strictObject({
  targetCompound: compoundReference,
  knownImpurities: z.array(compoundReference).max(50).default([]),
  group: shortText(60)
    .optional()
    .describe('id of a group where you are chemist; not needed when there is only one'),
  ...changeable,
});
export type NewRun = z.infer<typeof newRunSchema>;

/** Body of PATCH /api/v1/runs/{code}: what is left out stays, null empties a field. Target and group stay. */
export const runChangeSchema = z
  .strictObject({
    ...changeable,
    knownImpurities: z.array(compoundReference).max(50),
    reason: shortText(1000).describe('required when the change ends the signature of a fraction'),
  })
  .partial()
  .refine(({ reason: _, ...change }) => Object.keys(change).length > 0, 'Send at least one field to change.');
export type RunChange = z.infer<typeof runChangeSchema>;

export const runSchema = z.object({
  id: z.string(),
  code: z.string(),
  version: z.number(),
  group: nameRefSchema,
  chemist: nameRefSchema,
  targetCompound: compoundRefSchema,
  knownImpurities: z.array(compoundRefSchema),
  technique: z.string(),
  chargeMassG: z.number(),
  chargeSource: z.string(),
  chargeLot: z.string().nullable(),
  columnStages: z.number().nullable(),
  bath: z.string().nullable(),
  bathTemperatureC: z.number().nullable(),
  plannedPressureMbar: z.number().nullable(),
  safetyChecks: z.record(z.string(), z.boolean()),
  residueMassG: z.number().nullable(),
  note: z.string().nullable(),
  startedAt: z.string(),
  endedAt: z.string().nullable(),
});
export type RunJson = z.infer<typeof runSchema>;

export const runListQuery = z.strictObject({
  ...pageQuery,
  q: z.string().trim().min(1).max(100).optional().describe('part of a code, source, lot or target name'),
  group: z.string().max(60).optional().describe('id of a group'),
  compound: z.string().trim().min(1).max(200).optional().describe('id, CAS number or name of the target'),
});
export type RunListQuery = z.infer<typeof runListQuery>;

export const runRowSchema = z.object({
  id: z.string(),
  code: z.string(),
  version: z.number(),
  targetCompound: compoundRefSchema,
  technique: z.string(),
  chargeMassG: z.number(),
  chemist: z.string(),
  group: nameRefSchema,
  startedAt: z.string(),
  endedAt: z.string().nullable(),
  fractionCount: z.number(),
  signedOffCount: z.number(),
});
export type RunRow = z.infer<typeof runRowSchema>;
export const runPageSchema = z.object({ items: z.array(runRowSchema), nextCursor: z.string().nullable() });
