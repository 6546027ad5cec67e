import { z } from 'zod';
import { listAuditEvents } from '@/lib/audit/list-events';
import { auditEventSchema, auditQuery } from '@/lib/audit/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'The audit trail, newest first: of one record, one actor, one type, or since a time',
  query: auditQuery,
  response: z.object({ items: z.array(auditEventSchema), nextCursor: z.string().nullable() }),
  handle: async ({ actor, query }) => ({ json: await listAuditEvents(actor, query) }),
});
