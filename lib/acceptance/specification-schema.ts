import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';
import { criteriaSchema } from './criteria/registry';

/** A specification as it is sent. A new edition of a grade never changes an older one. */
export const newSpecificationSchema = z.strictObject({
  grade: z.string().trim().min(1).max(80).default('working grade').describe('what the limits are for'),
  decisionRule: z
    .enum(['simple', 'guarded'])
    .default('guarded')
    .describe('guarded: the uncertainty counts against it (JCGM 106:2012, 8.3.2); simple: the number alone'),
  criteria: criteriaSchema,
  note: z.string().trim().max(1000).optional(),
  group: z.uuid().optional().describe('needed only by a PI of several groups'),
  approve: z.boolean().default(false).describe('true: in force at once, approved by the PI who writes it'),
});

export const specificationSchema = z.object({
  id: z.string(),
  group: z.object({ id: z.string(), name: z.string() }),
  compoundId: z.string(),
  grade: z.string(),
  edition: z.number().int(),
  decisionRule: z.enum(['simple', 'guarded']),
  criteria: criteriaSchema,
  note: z.string().nullable(),
  writtenBy: z.string(),
  approvedBy: z.string().nullable(),
  approvedAt: z.string().nullable(),
  inForce: z.boolean().describe('approved last for this compound in this group'),
  createdAt: z.string(),
  version: z.number().int(),
});

export const specificationListQuery = z.strictObject({ ...pageQuery });
export const specificationPageSchema = z.object({
  items: z.array(specificationSchema),
  nextCursor: z.string().nullable(),
});

export type NewSpecification = z.output<typeof newSpecificationSchema>;
export type SpecificationJson = z.output<typeof specificationSchema>;
