import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';

export const queueQuery = z.strictObject({ ...pageQuery });

export const waitingSchema = z.object({
  code: z.string(),
  compound: z.string(),
  cut: z.string(),
  status: z.string(),
  verdictState: z.string(),
  purityPercent: z.number().nullable(),
  summary: z.string().nullable(),
  collectedBy: z.string(),
  since: z.string(),
  reason: z.string().nullable().describe('said with the step that brought it here'),
  mine: z.boolean().describe('collected by the reader, who may then not sign it'),
});

export type Waiting = z.output<typeof waitingSchema>;
