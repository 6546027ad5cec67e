import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';
import { cuts, fractionStatuses } from './fraction-states';
import {
  compoundRefSchema,
  headTemperatureC,
  instant,
  massG,
  nameRefSchema,
  pressureMbar,
  shortText,
} from './quantities';

export const verdictStates = ['pass', 'fail', 'inconclusive', 'blind', 'incomplete'] as const;

const values = {
  headTemperatureFromC: headTemperatureC.nullish(),
  headTemperatureToC: headTemperatureC.nullish(),
  pressureMbar: pressureMbar.nullish().describe('absolute, at the head'),
  tareMassG: massG.nullish().describe('empty receiver'),
  grossMassG: massG.nullish().describe('receiver with content'),
  appearance: shortText(300).nullish(),
  storagePlace: shortText(200).nullish(),
  collectedAt: instant.optional().describe('when the receiver was put on; now when left out'),
};

/** Body of POST /api/v1/runs/{code}/fractions. */
export const newFractionSchema = z.strictObject({ cut: z.enum(cuts), ...values });
export type NewFraction = z.infer<typeof newFractionSchema>;

/** Body of PATCH /api/v1/fractions/{code}: what is left out stays, null empties a field. */
export const fractionChangeSchema = z
  .strictObject({
    ...values,
    cut: z.enum(cuts).optional(),
    reason: shortText(1000).optional().describe('required when the fraction is signed off'),
  })
  .refine(({ reason: _, ...change }) => Object.keys(change).length > 0, 'Send at least one field to change.');
export type FractionChange = z.infer<typeof fractionChangeSchema>;

/** A fraction without its evidence, as commands answer it. */
export const fractionSchema = z.object({
  id: z.string(),
  code: z.string(),
  version: z.number(),
  run: z.string(),
  number: z.number(),
  compound: compoundRefSchema,
  cut: z.enum(cuts),
  headTemperatureFromC: z.number().nullable(),
  headTemperatureToC: z.number().nullable(),
  pressureMbar: z.number().nullable(),
  tareMassG: z.number().nullable(),
  grossMassG: z.number().nullable(),
  netMassG: z.number().nullable(),
  appearance: z.string().nullable(),
  storagePlace: z.string().nullable(),
  status: z.enum(fractionStatuses),
  verdict: z.enum(verdictStates),
  purityPercent: z.number().nullable(),
  collectedAt: z.string(),
  collectedBy: nameRefSchema,
});
export type FractionJson = z.infer<typeof fractionSchema>;
export const fractionsOfRunSchema = z.object({
  items: z.array(fractionSchema),
  nextCursor: z.string().nullable(),
});
export const fractionsOfRunQuery = z.strictObject({ ...pageQuery });

export const fractionSorts = ['-collectedAt', '-purity', 'code'] as const;
export type FractionSort = (typeof fractionSorts)[number];

const dayOrInstant = z.union([z.iso.date(), instant], {
  error: 'Give a day such as 2026-11-02, or a time in ISO 8601.',
});

/** The filters of GET /api/v1/fractions, and of the browse page's address. */
export const fractionFilters = {
  compound: z.string().trim().min(1).max(200).optional().describe('id, CAS number, or part of a name'),
  run: z.string().trim().min(1).max(30).optional().describe('code of a run'),
  cut: z.enum(cuts).optional(),
  status: z.enum(fractionStatuses).optional(),
  verdict: z.enum(verdictStates).optional(),
  group: z.string().max(60).optional().describe('id of a group'),
  collectedFrom: dayOrInstant.optional(),
  collectedTo: dayOrInstant.optional().describe('a day counts to its end, UTC'),
  purityMin: z.coerce.number().min(0).max(100).optional().describe('per cent'),
  q: z.string().trim().min(1).max(100).optional().describe('part of a code, compound, storage place or look'),
};
export const fractionListQuery = z.strictObject({
  ...pageQuery,
  ...fractionFilters,
  sort: z.enum(fractionSorts).default('-collectedAt'),
});
export type FractionListQuery = z.infer<typeof fractionListQuery>;

export const fractionRowSchema = z.object({
  id: z.string(),
  version: z.number(),
  code: z.string(),
  run: z.string(),
  compound: compoundRefSchema,
  cut: z.enum(cuts),
  netMassG: z.number().nullable(),
  status: z.enum(fractionStatuses),
  verdict: z.enum(verdictStates),
  purityPercent: z.number().nullable(),
  collectedAt: z.string(),
  collectedBy: z.string(),
  group: nameRefSchema,
});
export type FractionRow = z.infer<typeof fractionRowSchema>;
export const fractionPageSchema = z.object({
  items: z.array(fractionRowSchema),
  nextCursor: z.string().nullable(),
});
