import { z } from 'zod';
import { evidenceLinks, evidenceResponse } from '@/lib/evidence/schema';
import { pageQuery } from '@/lib/http/paging';

export const trayQuery = z.strictObject(pageQuery);
export const trayItemId = z.strictObject({ id: z.uuid() });
export const fileTrayItemBody = z.strictObject({
  fraction: z.string().trim().min(1, 'Say which fraction the file belongs to.').max(60).describe('code'),
});

export const trayItemResponse = z.object({
  id: z.uuid(),
  reason: z.string().describe('why the file waits'),
  askedFor: z.string().nullable().describe('what the sender said'),
  instrument: z.string().nullable(),
  receivedAt: z.iso.datetime(),
  evidence: evidenceResponse,
  links: evidenceLinks,
  filedAt: z.iso.datetime().nullable(),
  version: z.number().int(),
});
export type TrayItemView = z.infer<typeof trayItemResponse>;

export const filedResponse = trayItemResponse.extend({
  notes: z.array(z.string()).optional().describe('what could not be read from the file, and what to do'),
});
export type FiledView = z.infer<typeof filedResponse>;

export const trayResponse = z.object({ items: z.array(trayItemResponse), nextCursor: z.string().nullable() });
export type TrayPage = z.infer<typeof trayResponse>;
