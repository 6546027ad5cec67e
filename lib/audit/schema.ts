import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';

export const auditQuery = z.strictObject({
  ...pageQuery,
  record: z
    .string()
    .regex(/^[a-z_]+:[\w-]{1,64}$/, 'is a kind and an id, such as fraction:<id>')
    .optional()
    .describe('events of one record, as kind:id'),
  actor: z.uuid().optional().describe('events caused by this account or token'),
  from: z.iso.datetime({ offset: true }).optional().describe('events at or after this time'),
  type: z.string().max(60).optional().describe('events of one type, such as fraction.signed_off'),
});

export const auditEventSchema = z.object({
  sequence: z.number(),
  id: z.string(),
  at: z.string(),
  type: z.string(),
  recordType: z.string(),
  recordId: z.string(),
  groupId: z.string().nullable(),
  actorKind: z.enum(['user', 'token', 'system']),
  actorId: z.string().nullable(),
  actorName: z.string(),
  reason: z.string().nullable(),
  before: z.unknown(),
  after: z.unknown(),
  origin: z.unknown(),
  previousHash: z.string(),
  hash: z.string(),
});
export type PresentedAuditEvent = z.infer<typeof auditEventSchema>;
